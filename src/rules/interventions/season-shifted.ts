import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

export const interventionsSeasonShifted = rule({
  id: 'interventions.season-shifted',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement:
    'A simulated season (leaf area, evapotranspiration, irrigation) leads or lags the observed one by two months or more, by the best correlation of the monthly means and by the phase of their yearly wave.',
  why: 'Leaves and irrigation at the wrong time take water from the wrong months, and a calibration hides it in the soil.',
  source: {
    basis: 'house',
    citation: 'Our own limit; monthly climatologies, correlation at whole lags, and the first harmonic',
  },
  clear:
    'Look for a default calendar, one of the other hemisphere, or planting and leaf dates that were never set; set them for this place.',
  limits: {
    season_months: {
      default: 2,
      unit: 'months',
      states: 'lead or lag from which a season is shifted',
      looser: 'higher',
    },
  },
  check: (_, { seasons, manifest }, limits) =>
    seasons.flatMap((lag, index): readonly Draft[] => {
      const { variable = 'other' } = manifest.data.seasons?.[index] ?? {};
      const what = variable.replaceAll('_', ' ');
      const about = { record: 'interventions', field: ['seasons', index], subject: `${index} ${variable}` };
      if (!isDefined(lag))
        return [
          {
            ...about,
            message: `The simulated season of ${what} can’t be held against the observed one: ${lag.undefined}.`,
            clear: 'State both series so that they can be read and have every calendar month in common.',
          },
        ];
      const { months, phaseMonths: phase, correlationAtLag, correlationAtZero, pairs } = lag.value;
      const limit = limits.season_months ?? 0;
      // Whole months stand for half a month to either side.
      const confirmed = !isDefined(phase) || Math.abs(phase.value) >= limit - 0.5;
      if (Math.abs(months) < limit || !confirmed) return [];
      const side =
        Math.abs(months) === 6
          ? 'six months away from'
          : `${Math.abs(months)} months ${months > 0 ? 'behind' : 'ahead of'}`;
      return [
        {
          ...about,
          found: months,
          unit: 'months',
          message: `The simulated season of ${what} is ${side} the observed one.`,
          detail: [
            `correlation of the twelve monthly means ${figure(correlationAtZero)} as they are, ${figure(correlationAtLag)} when shifted; ${pairs} months`,
            ...(isDefined(phase)
              ? [
                  `the yearly wave is ${figure(Math.abs(phase.value))} months ${phase.value > 0 ? 'late' : 'early'}`,
                ]
              : []),
          ],
        },
      ];
    }),
});
