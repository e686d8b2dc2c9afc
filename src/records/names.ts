import type { FieldPath } from '../manifest/manifest.ts';
import { nearestName } from '../manifest/nearest.ts';
import { fieldAt, valueAt } from './field.ts';
import { namedAreas } from './record.ts';
import type { Stated, StatementIn } from './statements.ts';

/** A place in the manifest that names a record, or a field of one. */
export interface Reference {
  /** As a record id or field address: `inputs.rainfall`, `periods.calibration`. */
  readonly to: string;
  /** As it is written there: `rainfall`. */
  readonly written: string;
  readonly field: FieldPath;
}

/** Whether an entry among paths is the name of a record. A file whose path looks like one is written `./inputs.csv`. */
export function isRecordName(entry: string): boolean {
  const [area = '', ...more] = entry.split('.');
  const isNamed = (namedAreas as readonly string[]).includes(area);
  return entry === 'parameters' || (isNamed && more.length > 0 && !entry.includes('/'));
}

/**
 * What a name stands for: a record; all records made from a fragment with `each`; the address of a field that
 * exists. Null where it stands for nothing.
 */
export function resolveName(name: string, stated: Stated): readonly string[] | null {
  if (stated.statements.has(name)) return [name];
  const keys = name.replace(/^scenarios\./, 'scenarios.cases.').split('.');
  if (valueAt(stated.manifest.data, [...keys, 'each']) !== undefined) {
    return [...stated.statements.keys()].filter((id) => id.startsWith(`${name}.`));
  }
  return fieldAt(name, stated) === undefined ? null : [name];
}

/** The known name most like one that stands for nothing, written as that one is. */
export function nearestKnown({ to, written }: Reference, { statements }: Stated): string | undefined {
  const before = to.slice(0, to.length - written.length);
  const names = [...statements.keys()]
    .filter((id) => id.startsWith(before))
    .map((id) => id.slice(before.length));
  return nearestName(written, names);
}

/** The run that an evaluation target is simulated by. */
export function runOfTarget(target: string, { statements }: Stated): string | undefined {
  const evaluation = statements.get(`evaluation.${target}`) as StatementIn<'evaluation'> | undefined;
  return evaluation?.fragment.simulated?.run;
}
