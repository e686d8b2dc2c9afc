import type { Waiver } from '../manifest/data.generated.ts';

/** What a waiver is held against. */
export interface Waivable {
  readonly rule: string;
  readonly record: string;
  readonly subject?: string | undefined;
}

/** Whether a waiver, whatever its date and signature, is meant for a finding. */
export function isMeantFor(waiver: Waiver, { rule, record, subject }: Waivable): boolean {
  return (
    waiver.rule === rule &&
    (waiver.record === undefined || waiver.record === record) &&
    (waiver.subject === undefined || waiver.subject === subject)
  );
}
