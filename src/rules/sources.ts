import type { Source } from './rule.ts';

/** Sources that several rules share. */
export const fair: Source = {
  basis: 'published',
  citation:
    'Wilkinson, M. D. et al. (2016) The FAIR Guiding Principles for scientific data management and stewardship. Scientific Data 3:160018. doi:10.1038/sdata.2016.18',
};

export const ep621: Source = {
  basis: 'published',
  citation:
    'ASABE (2017) Engineering Practice EP621: Guidelines for Calibrating, Validating, and Evaluating Hydrologic and Water Quality (H/WQ) Models. American Society of Agricultural and Biological Engineers, St. Joseph, Michigan',
};

export const cfUnits: Source = {
  basis: 'published',
  citation:
    'Eaton, B. et al. (2023) NetCDF Climate and Forecast (CF) Metadata Conventions, version 1.11, section 3.1 Units; units as read by UDUNITS-2, Unidata, Boulder, Colorado',
};

export const klemes: Source = {
  basis: 'published',
  citation:
    'Klemeš, V. (1986) Operational testing of hydrological simulation models. Hydrological Sciences Journal 31(1):13-24',
};

export const moriasi2007: Source = {
  basis: 'published',
  citation:
    'Moriasi, D. N. et al. (2007) Model evaluation guidelines for systematic quantification of accuracy in watershed simulations. Transactions of the ASABE 50(3):885-900',
};
