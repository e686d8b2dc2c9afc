import type { Found } from '../facts/facts.ts';
import type { Waiver } from '../manifest/data.generated.ts';

/** Whether a waiver, whatever its date and signature, is meant for a finding. */
export function isMeantFor(waiver: Waiver, { rule, record, subject }: Found): boolean {
  return (
    waiver.rule === rule &&
    (waiver.record === undefined || waiver.record === record) &&
    (waiver.subject === undefined || waiver.subject === subject)
  );
}
