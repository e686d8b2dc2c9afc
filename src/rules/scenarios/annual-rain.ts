import type { Facts } from '../../facts/facts.ts';
import type { RecordNode } from '../../records/record.ts';

/** Whether a driver is rain over whole years: an input of precipitation on either side, or called so. */
export function isAnnualRain(
  name: string,
  { fragment }: RecordNode<'scenarios'>,
  { manifest, records }: Pick<Facts, 'manifest' | 'records'>,
): boolean {
  const condition = manifest.data.scenarios?.conditions?.[name];
  if (condition === undefined || condition.months !== undefined) return false;
  const inputs = [condition.input, fragment.drivers?.[name]?.input];
  const isRain = inputs.some((input) => {
    const record = records.nodes.get(`inputs.${input}`) as RecordNode<'inputs'> | undefined;
    return record?.fragment.role === 'precipitation';
  });
  return isRain || /rain|precipitation/i.test(name);
}
