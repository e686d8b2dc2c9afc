/** Stoplog as a library: read a state of a repository, and judge it. */
export { type ExamineOptions, examine } from './commands/examine.ts';
export { stoplogFiles } from './commands/studies.ts';
export { Failure, type FailureCode, failureCodes } from './failure.ts';
export { jsonReport } from './reports/json.ts';
export { textReport } from './reports/text.ts';
export { snapshotFromMemory } from './repository/memory.ts';
export { openSnapshot } from './repository/open-snapshot.ts';
export { openRepository } from './repository/repository.ts';
export type { At, Snapshot } from './repository/snapshot.ts';
export { rules } from './rules/index.ts';
export type {
  Comparison,
  Cured,
  Finding,
  Level,
  ManifestVerdict,
  State,
  Totals,
  Verdict,
} from './verdict/finding.ts';
