import { few, figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';

export const inputsIncompleteTotal = rule({
  id: 'inputs.incomplete-total',
  scope: 'inputs',
  from: 'warn',
  means: null,
  statement:
    'A monthly or yearly figure is that of the days that happen to be there: a total with days missing, or a mean with 11 missing or 5 in a row. Checked where the record rests on, or is compared with, a daily or finer input.',
  why: 'A total without its missing days is too low by as much as fell on them, and nothing in the monthly file shows it.',
  source: {
    basis: 'published',
    citation:
      'World Meteorological Organization (2017) WMO Guidelines on the Calculation of Climate Normals, WMO-No. 1203 (the numbers for means from memory)',
  },
  clear: 'Set the month or year to missing, or fill the days first and say so in `preparation`.',
  check: ({ id, name, field }, { profiles }) =>
    [...(profiles.get(name ?? '')?.incompleteTotals ?? [])].map(([fine, totals]): Draft => {
      const told = totals.map(
        ({ label, missing, steps }) => `${label} (${figure(missing)} of ${figure(steps)} steps missing)`,
      );
      return {
        record: id,
        field,
        subject: fine,
        found: totals.length,
        message: `${totals.length === 1 ? 'One figure is that' : `${figure(totals.length)} figures are those`} of the steps that ${fine} happens to have: ${few(told)}.`,
      };
    }),
});
