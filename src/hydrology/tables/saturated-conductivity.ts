/** Saturated hydraulic conductivity of a soil texture (USDA classes), by two surveys. */
export interface ConductivityRow {
  readonly class: string;
  /** mm/h; Rawls, Brakensiek & Saxton 1982, Table 2. Null where they have no such class. */
  readonly rawlsMmPerHour: number | null;
  /** cm/d; Carsel & Parrish 1988, class means. */
  readonly carselCmPerDay: number;
}

export const conductivitySource =
  'Rawls, W. J., Brakensiek, D. L. & Saxton, K. E. (1982) Estimation of soil water properties. Trans. ASAE 25(5):1316-1320, Table 2; Carsel, R. F. & Parrish, R. S. (1988) Developing joint probability distributions of soil water retention characteristics. Water Resour. Res. 24(5):755-769';

type Row = readonly [texture: string, rawlsMmPerHour: number | null, carselCmPerDay: number];

/** Read in one (Rawls) and three (Carsel) public copies; from coarse to fine. */
const rows: readonly Row[] = [
  ['sand', 210.0, 712.8],
  ['loamy sand', 61.1, 350.2],
  ['sandy loam', 25.9, 106.1],
  ['loam', 13.2, 24.96],
  ['silt', null, 6.0],
  ['silt loam', 6.8, 10.8],
  ['sandy clay loam', 4.3, 31.44],
  ['clay loam', 2.3, 6.24],
  ['silty clay loam', 1.5, 1.68],
  ['sandy clay', 1.2, 2.88],
  ['silty clay', 0.9, 0.48],
  ['clay', 0.6, 4.8],
];

export const saturatedConductivity: readonly ConductivityRow[] = rows.map(
  ([texture, rawlsMmPerHour, carselCmPerDay]) => ({ class: texture, rawlsMmPerHour, carselCmPerDay }),
);
