import { windowSets } from '../../facts/windows.ts';
import { dayNumber, type Period } from '../../manifest/period.ts';
import { rule } from '../rule.ts';

export const periodsShort = rule({
  id: 'periods.short',
  scope: 'manifest',
  from: 'warn',
  means: null,
  statement: 'The calibration has fewer than three complete hydrological years.',
  why: 'With one or two years the parameters have seen one kind of weather. Three to five years that include an average, a wet and a dry one are the usual advice.',
  source: {
    basis: 'published',
    citation:
      'Gan, T. Y., Dlamini, E. M. & Biftu, G. F. (1997) Effects of model complexity and structure, data quality, and objective functions on hydrologic modeling. J. Hydrol. 192:81-103, as cited in Moriasi, D. N. et al. (2007) Trans. ASABE 50(3):885-900, p. 892',
  },
  clear: 'Calibrate on a longer window, or say in the note why the record allows no more.',
  limits: {
    calibration_years: {
      default: 3,
      unit: 'a',
      states: 'fewest complete years of calibration',
      looser: 'lower',
    },
  },
  check: (_, { records }, limits) => {
    const begins = records.manifest.data.periods?.year_begins ?? '01-01';
    const needed = limits.calibration_years ?? 0;
    return windowSets(records).flatMap(({ record, windows }) => {
      const calibration = windows.filter(({ kind }) => kind === 'calibration');
      const [first] = calibration;
      const years = calibration.reduce((sum, { period }) => sum + completeYears(period, begins), 0);
      const inherited = record !== 'periods' && first?.field[0] === 'periods';
      if (first === undefined || inherited || years >= needed) return [];
      return [
        {
          record,
          field: first.field,
          found: years,
          unit: 'complete years',
          message: `The calibration holds ${years} complete year${years === 1 ? '' : 's'} from ${begins}; at least ${needed} are advised.`,
        },
      ];
    });
  },
});

/** Years that begin on the given month and day and lie wholly inside. */
function completeYears({ first, last }: Period, begins: string): number {
  const from = Number(first.slice(0, 4)) + (first.slice(5) <= begins ? 0 : 1);
  const end = dayNumber(last) + 1;
  const to = Number(last.slice(0, 4)) + 1;
  let years = 0;
  for (let year = from; year < to; year += 1) {
    if (dayNumber(`${String(year + 1).padStart(4, '0')}-${begins}`) <= end) years += 1;
  }
  return years;
}
