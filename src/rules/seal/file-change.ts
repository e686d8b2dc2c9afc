import type { Facts } from '../../facts/facts.ts';
import type { RecordNode } from '../../records/record.ts';
import type { Change } from '../../records/seal.ts';
import type { SeriesDifference } from '../../series/difference.ts';
import { figure } from '../figures.ts';

export type FileChange = Extract<Change, { kind: 'file' }>;

/** What changed in a file in the data's own terms, as one line; none where nothing can be said. */
export function fileChange(
  { path, was, now }: FileChange,
  named: boolean,
  record: RecordNode,
  { differences }: Pick<Facts, 'differences'>,
): readonly string[] {
  const difference = differences.get(path);
  const before = named ? `${path}: ` : '';
  if (difference !== undefined) return [before + seriesChange(difference, stepOf(record))];
  if (was?.bytes == null || now === null || now.kind === 'unavailable') return [];
  return [`${before}${figure(was.bytes)} -> ${figure(now.bytes)} bytes`];
}

/** `14 of 5 113 values differ; total 11 402 -> 11 655 mm (+2.2 %), 2007-01-03 to 2007-01-16` */
function seriesChange(difference: SeriesDifference, step: string | undefined): string {
  const { values, changed, totalBefore, totalAfter, first, last, unit, unread } = difference;
  if (changed === 0 && unread > 0)
    return `no value that can be read differs, but ${figure(unread)} ${unread === 1 ? 'row' : 'rows'} can’t be read`;
  if (changed === 0) return 'no value differs; only how the file is written (line ends, names, order)';
  const amount = amountUnit(unit, step);
  const share = totalBefore === 0 ? '' : ` (${percent((totalAfter - totalBefore) / Math.abs(totalBefore))})`;
  const total = `${amount === null ? 'sum of values' : 'total'} ${figure(totalBefore)} -> ${figure(totalAfter)} ${amount ?? unit}${share}`;
  const when = first === last ? `on ${first}` : `${first} to ${last}`;
  return `${figure(changed)} of ${figure(values)} values differ; ${total}, ${when}`;
}

function percent(share: number): string {
  const text = (100 * share).toPrecision(2);
  return `${share < 0 ? '' : '+'}${Math.abs(share) >= 1 ? Math.round(100 * share) : Number(text)} %`;
}

/** The unit of a sum over time: mm for daily values in mm/d. Null where a sum tells no amount, as of flows or temperatures. */
function amountUnit(unit: string, step: string | undefined): string | null {
  if (/^(?:mm|cm|in|inch|kg|t)$/.test(unit)) return unit;
  const perStep =
    step === 'P1D'
      ? /(?:\s*\/\s*(?:d|day)|\s+(?:d|day)-1)$/
      : step === 'PT1H'
        ? /(?:\s*\/\s*h|\s+h-1)$/
        : null;
  return perStep?.test(unit) ? unit.replace(perStep, '') : null;
}

function stepOf({ area, fragment }: RecordNode): string | undefined {
  return area === 'inputs' ? (fragment as RecordNode<'inputs'>['fragment']).series?.step : undefined;
}
