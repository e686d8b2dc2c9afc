import { rule } from '../rule.ts';

export const inputsDayUnstated = rule({
  id: 'inputs.day-unstated',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement: 'Daily rain or flow without the hour at which the day ends and the offset from UTC.',
  why: 'A rain day read at 09:00 belongs mostly to the day before. Paired with flow days that end at midnight, rain arrives late or early by up to a day, and calibration bends the routing to make up for it.',
  source: {
    basis: 'practice',
    citation: 'Common practice: daily totals are published with the hour of observation and the time zone.',
  },
  clear: 'Write `series.day_ends` (such as "09:00" or "24:00") and `series.utc_offset` (such as "+00:00").',
  check({ id, field, fragment: { role, series } }) {
    const counts = (role === 'precipitation' || role === 'streamflow') && series?.step === 'P1D';
    if (!counts || (series.day_ends !== undefined && series.utc_offset !== undefined)) return [];
    const lacking = [
      series.day_ends === undefined ? 'at which hour the day ends' : '',
      series.utc_offset === undefined ? 'at which offset from UTC the hours are' : '',
    ].filter((one) => one !== '');
    return [
      {
        record: id,
        field: [...field, 'series'],
        message: `Daily ${role === 'precipitation' ? 'rain' : 'flow'} is given without saying ${lacking.join(', or ')}.`,
      },
    ];
  },
});
