import type { Facts } from '../../facts/facts.ts';
import { inputsNamed } from '../../facts/series-of.ts';
import type { RecordNode } from '../../records/record.ts';

/** Whether a driver is rain over whole years: an input of precipitation on either side, or called so. */
export function isAnnualRain(
  name: string,
  { fragment }: RecordNode<'scenarios'>,
  { manifest, records }: Pick<Facts, 'manifest' | 'records'>,
): boolean {
  const condition = manifest.data.scenarios?.conditions?.[name];
  if (condition === undefined || condition.months !== undefined) return false;
  const isRain = [condition.input, fragment.drivers?.[name]?.input]
    .flatMap((input) => (input === undefined ? [] : inputsNamed(input, records)))
    .some((input) => input.fragment.role === 'precipitation');
  return isRain || /rain|precipitation/i.test(name);
}
