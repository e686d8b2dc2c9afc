import type { RecordNode, Records } from '../records/record.ts';
import { inputsNamed } from './series-of.ts';

/** The inputs that a run takes; all that `each` makes of one that is named without its entry. */
export function inputsTakenBy(
  run: RecordNode<'runs'> | undefined,
  records: Records,
): readonly RecordNode<'inputs'>[] {
  return (run?.fragment.takes ?? []).flatMap((taken) =>
    taken.startsWith('inputs.') ? inputsNamed(taken.slice('inputs.'.length), records) : [],
  );
}
