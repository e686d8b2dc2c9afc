/** World record point rainfall: nothing plausible lies above it. An areal mean or a fixed day catches less. */
export interface RainfallRecord {
  readonly hours: number;
  readonly mm: number;
  readonly duration: string;
  readonly where: string;
  readonly source: string;
}

const archive = 'WMO World Weather and Climate Extremes Archive';
const press988 = 'WMO press release 988';

export const rainfallRecords: readonly RainfallRecord[] = [
  {
    hours: 1 / 60,
    mm: 31.2,
    duration: '1 minute',
    where: 'Unionville, Maryland, 1956-07-04',
    source: `${archive}; value from memory`,
  },
  {
    hours: 42 / 60,
    mm: 305,
    duration: '42 minutes (60 in the archive)',
    where: 'Holt, Missouri, 1947-06-22',
    source: archive,
  },
  {
    hours: 1,
    mm: 401,
    duration: '1 hour',
    where: 'Shangdi, Inner Mongolia, 1975-07-03 (place from memory)',
    source: 'list of the United States weather service, not in the WMO archive',
  },
  {
    hours: 12,
    mm: 1144,
    duration: '12 hours',
    where: 'Foc-Foc, La Reunion, 1966-01',
    source: archive,
  },
  {
    hours: 24,
    mm: 1825,
    duration: '24 hours',
    where: 'Foc-Foc, La Reunion, 1966-01-07/08',
    source: archive,
  },
  {
    hours: 48,
    mm: 2493,
    duration: '48 hours',
    where: 'Cherrapunji, 1995-06-15/16',
    source: press988,
  },
  {
    hours: 72,
    mm: 3930,
    duration: '72 hours',
    where: 'Cratere Commerson, La Reunion, 2007-02',
    source: `${archive}; value from memory`,
  },
  {
    hours: 96,
    mm: 4936,
    duration: '96 hours',
    where: 'Cratere Commerson, La Reunion, 2007-02',
    source: `${archive}; value from memory`,
  },
  {
    hours: 31 * 24,
    mm: 9398,
    duration: '1 month',
    where: 'Cherrapunji, 1861-07',
    source: '370 inches in a public page; 9300 mm from memory, the larger is kept as bound',
  },
  {
    hours: 366 * 24,
    mm: 26_470,
    duration: '12 months',
    where: 'Cherrapunji, 1860-08 to 1861-07',
    source: press988,
  },
];
