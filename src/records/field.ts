import type { Stated, Statement } from './statements.ts';

/** The settings of the interventions that the model represents: what runs rest on, beside the record itself. */
export const settingsAddress = 'interventions.settings';

/** What stands at the address of a field, such as `periods.calibration`; undefined where nothing does. */
export function fieldAt(address: string, { statements }: Stated): unknown {
  const holder = holderOf(address, statements);
  if (holder === undefined) return undefined;
  if (address === settingsAddress) return representedSettings(holder).size > 0 || undefined;
  return valueAt(holder.fragment, keysBelow(holder.id, address));
}

/** The record that an address leads into: `periods` for `periods.calibration`. */
export function holderOf<Holder>(address: string, records: ReadonlyMap<string, Holder>): Holder | undefined {
  for (let id = address; id !== ''; id = id.slice(0, Math.max(0, id.lastIndexOf('.')))) {
    const holder = records.get(id);
    if (holder !== undefined) return holder;
  }
  return undefined;
}

/** `['periods', 'calibration']` for `evaluation.outlet.periods.calibration` below the record `evaluation.outlet`. */
export function keysBelow(holder: string, address: string): readonly string[] {
  return address === holder ? [] : address.slice(holder.length + 1).split('.');
}

/** The part of a value that keys lead to; undefined where they lead nowhere. */
export function valueAt(value: unknown, keys: readonly string[]): unknown {
  return keys.reduce<unknown>(
    (inner, key) =>
      typeof inner === 'object' && inner !== null && Object.hasOwn(inner, key)
        ? (inner as Record<string, unknown>)[key]
        : undefined,
    value,
  );
}

/** Places in the list of interventions whose settings the model takes. */
export function representedSettings({ fragment }: Pick<Statement, 'fragment'>): ReadonlySet<number> {
  const list = Array.isArray(fragment) ? fragment : [];
  return new Set(
    list.flatMap(({ represented, settings }, index) =>
      represented === true && settings !== undefined ? [index] : [],
    ),
  );
}
