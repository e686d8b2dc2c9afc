import type { Cured, Finding, Level, ManifestVerdict } from './finding.ts';
import { neverWaived } from './pass-reason.ts';

/** A manifest's verdict with the digests by which its records are told from those of another revision. */
export interface Judged {
  readonly verdict: ManifestVerdict;
  /** By record id. */
  readonly digests: ReadonlyMap<string, string>;
}

/**
 * What no past excuses: faults that leave nothing to judge by, a waiver whose last day has come, whoever let it come, and
 * what is itself said of a change.
 */
const neverStands: ReadonlySet<string> = new Set([...neverWaived, 'waiver.expired', 'manifest.loosened']);

const mildestFirst: readonly Level[] = ['note', 'warn', 'block'];

/**
 * Marks the findings that the base had already, and lists those of it that are gone. A finding stands only while its record's
 * digest is the base's, and while it weighs no more than it did there: who touches a record, or raises the phase, answers for it.
 * Of several findings with one fingerprint as many can stand as the base had.
 */
export function againstBase(now: Judged, base: Judged, asked: (record: string) => boolean): ManifestVerdict {
  const ofBase = new Map<string, Finding[]>();
  for (const finding of base.verdict.findings) {
    ofBase.set(finding.fingerprint, [...(ofBase.get(finding.fingerprint) ?? []), finding]);
  }
  const findings = now.verdict.findings.map((finding): Finding => {
    const before = ofBase.get(finding.fingerprint)?.shift();
    const standing =
      before !== undefined &&
      !neverStands.has(finding.rule) &&
      now.digests.get(finding.record) === base.digests.get(finding.record) &&
      mildestFirst.indexOf(finding.level) <= mildestFirst.indexOf(before.level);
    return { ...finding, standing };
  });
  const cured = [...ofBase.values()]
    .flat()
    .filter(({ rule, record }) => rule !== 'manifest.loosened' && asked(record));
  return {
    ...now.verdict,
    findings,
    cured: cured.map(
      ({ rule, record, message, fingerprint }): Cured => ({ rule, record, message, fingerprint }),
    ),
  };
}
