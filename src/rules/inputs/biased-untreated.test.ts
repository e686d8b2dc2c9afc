import { withValues } from '../../../tests/harness/edit-lines.ts';
import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsBiasedUntreated } from './biased-untreated.ts';

// sound.yaml's rain is the check gauge's over 0.97, and a step of its preparation speaks of a correction.
const untreated = ['inputs.rainfall.preparation'];

ruleCases(inputsBiasedUntreated, {
  fires: [
    {
      name: 'a fifth too little',
      remove: untreated,
      files: { 'data/rain.csv': withValues((mm) => mm * 0.97 * 0.8) },
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.compare_with',
        subject: 'bias',
        found: -20,
        unit: '%',
        message: 'has 20 % less than inputs.check-gauge over the days that both have in 9 years',
        level: 'warn',
      },
    },
    {
      name: 'a step that speaks of something else',
      set: { 'inputs.rainfall.preparation': [{ step: 'dates written anew', because: 'two formats' }] },
      files: { 'data/rain.csv': withValues((mm) => mm * 1.3) },
      finds: { subject: 'bias', message: 'more than' },
    },
    {
      name: 'a break of the double-mass curve',
      remove: untreated,
      files: {
        'data/rain.csv': longRecord((year) => (year > 2006 ? 0.85 : 1.1)),
        'data/check.csv': longRecord(() => 1),
      },
      finds: { subject: 'break', message: 'breaks against inputs.check-gauge: from 2007 on it has 22' },
    },
    {
      name: 'a break that a factor over all years does not mend',
      files: {
        'data/rain.csv': longRecord((year) => (year > 2006 ? 0.85 : 1.1)),
        'data/check.csv': longRecord(() => 1),
      },
      finds: { subject: 'break' },
    },
    {
      name: 'a break of one gauge of a mean',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/second.csv', 'data/third.csv'],
        'inputs.rainfall.combine': 'mean',
      },
      files: {
        'data/rain.csv': longRecord((year) => (year > 2006 ? 0.8 : 1)),
        'data/second.csv': longRecord(() => 1.5),
        'data/third.csv': longRecord(() => 2),
        'data/check.csv': longRecord(() => 1),
      },
      finds: { subject: 'data/rain.csv break', found: -20, message: /^data\/rain\.csv breaks/ },
    },
    {
      name: 'the right season in the wrong years',
      remove: untreated,
      files: {
        'data/rain.csv': longRecord((year) => (year % 2 === 0 ? 1.4 : 0.6)),
        'data/check.csv': longRecord((year) => (year % 2 === 0 ? 0.6 : 1.4)),
      },
      finds: {
        subject: 'years',
        message:
          /has the season of inputs\.check-gauge.*but not its wet and dry times: annual totals correlate at -/,
      },
    },
    {
      name: 'a reference of another time',
      remove: untreated,
      set: { 'inputs.rainfall.compare_with': { input: 'dry-climate' } },
      finds: {
        subject: 'comparison',
        message: 'can’t be compared with inputs.dry-climate: no step has a value in both',
      },
    },
  ],
  silent: [
    {
      name: 'a break that a step speaks of',
      set: {
        'inputs.rainfall.preparation': [
          { step: 'totals until 2006 times 0.77', because: 'the gauge was moved' },
        ],
      },
      files: {
        'data/rain.csv': longRecord((year) => (year > 2006 ? 0.85 : 1.1)),
        'data/check.csv': longRecord(() => 1),
      },
    },
    { name: 'a bias that is treated', files: { 'data/rain.csv': withValues((mm) => mm * 0.8) } },
    {
      name: 'nothing is named to compare with',
      remove: [...untreated, 'inputs.rainfall.compare_with'],
      files: { 'data/rain.csv': withValues((mm) => mm * 0.8) },
    },
    {
      name: 'a small bias',
      remove: untreated,
      files: { 'data/rain.csv': withValues((mm) => mm * 0.97 * 0.91) },
    },
    {
      name: 'another unit, which is no bias',
      remove: untreated,
      files: { 'data/rain.csv': withValues((mm) => mm / 25.4) },
    },
    { name: 'a reference that is not here', remove: untreated, files: { 'data/check.csv': null } },
    {
      name: 'a project that lets more pass',
      remove: untreated,
      set: {
        departures: [
          { threshold: 'inputs.annual_bias_percent', now: 25, because: 'gauges on two sides of a ridge' },
        ],
      },
      files: { 'data/rain.csv': withValues((mm) => mm * 0.8) },
    },
  ],
});

/** Twelve invented years of rain with wet winters, wet and dry years; a factor for each hydrological year. */
function longRecord(factorOf: (year: number) => number): string {
  const rows: string[] = [];
  for (let month = 0; month < 144; month++) {
    const calendar = (9 + month) % 12;
    const year = 2001 + Math.floor((9 + month) / 12);
    const days = new Date(Date.UTC(year, calendar + 1, 0)).getUTCDate();
    const ends = calendar >= 9 ? year + 1 : year;
    const daily = (3 + 2 * Math.cos((2 * Math.PI * calendar) / 12)) * (1 + 0.1 * (((ends * 7) % 5) - 2));
    for (let day = 1; day <= days; day++) {
      const date = `${year}-${String(calendar + 1).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
      const wet = (day * 7 + month) % 3 === 0 ? 3 : 0;
      rows.push(`${date},${(wet * daily * factorOf(ends)).toFixed(2)}\n`);
    }
  }
  return `date,rain_mm\n${rows.join('')}`;
}
