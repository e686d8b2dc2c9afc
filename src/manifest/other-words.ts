/**
 * Words of a manifest, values and keys, with what people write for them elsewhere. A word is offered only where the schema knows
 * it, so that one that could mean two things may stand at both.
 */
const otherWords: Readonly<Record<string, readonly string[]>> = {
  semicolon: [';'],
  comma: [','],
  tab: ['\t', '\\t'],
  blank: [' ', 'space', 'whitespace'],
  point: ['.', 'dot', 'period'],
  precipitation: ['rain', 'rainfall', 'precip'],
  streamflow: ['discharge', 'flow', 'river flow', 'runoff'],
  evapotranspiration: ['et', 'pet', 'evaporation'],
  terrain: ['dem', 'elevation', 'topography'],
  land_cover: ['landuse', 'land use'],
  vegetation: ['lai'],
  leaf_area: ['lai'],
  soil_water: ['soil moisture'],
  low: ['low flow', 'low flows', 'drought'],
  high: ['high flow', 'high flows', 'flood', 'floods'],
  scale: ['multiply', 'factor', 'relative'],
  shift: ['add', 'offset'],
  set: ['replace', 'absolute'],
  elsewhere: ['external', 'remote'],
  mean: ['average'],
  sum: ['total'],
  true: ['yes', 'y', 'on'],
  false: ['no', 'n', 'off'],
  PT1H: ['hourly', 'hour', '1h', 'h'],
  P1D: ['daily', 'day', '1d', 'd'],
  P1M: ['monthly', 'month'],
  P1Y: ['yearly', 'annual', 'year'],
  '+00:00': ['utc', 'gmt', 'z', '0'],
  '01-01': ['january', '1 january'],
  '04-01': ['april', '1 april'],
  '09-01': ['september', '1 september'],
  '10-01': ['october', '1 october'],
  '11-01': ['november', '1 november'],
  separator: ['delimiter', 'delim', 'sep'],
  skip_lines: ['skip rows', 'skiprows', 'header lines'],
  missing: ['na', 'na values', 'nodata', 'missing values'],
  step: ['time step', 'timestep', 'frequency'],
  utc_offset: ['timezone', 'time zone', 'tz'],
  pattern: ['format', 'date format'],
  latitude: ['lat'],
  longitude: ['lon', 'lng'],
  warm_up: ['spin up', 'spinup'],
  start: ['command'],
  gives: ['outputs'],
  takes: ['inputs'],
  because: ['reason', 'why'],
};

/** The words of a manifest for which a word may stand. */
export function wordsMeantBy(written: string): readonly string[] {
  const plain = written.length === 1 ? written : written.trim().toLowerCase().replace(/[-_]/g, ' ');
  return Object.entries(otherWords).flatMap(([word, others]) => (others.includes(plain) ? word : []));
}
