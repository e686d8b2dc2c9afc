import type { Facts } from '../facts/facts.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { ManifestVerdict, Verdict } from '../verdict/finding.ts';
import type { Framework } from './frameworks/framework.ts';

/** One manifest of the revision with everything that was found out about it. */
export interface DossierStudy {
  /** Manifest, records, standings, profiles, scores, readings and what else was computed. */
  readonly facts: Facts;
  readonly verdict: ManifestVerdict;
  /** Frameworks that the group keeps beside the manifest, for the crosswalk. */
  readonly frameworks: readonly Framework[];
}

/** All that a dossier is made of. Dates are the commit's: the same revision gives the same bytes. */
export interface DossierContent {
  /** Version of Stoplog that made it. */
  readonly madeBy: string;
  /** Full id of the commit. */
  readonly commit: string;
  /** Committer's date of the commit, ISO 8601 in UTC, such as `2025-03-12T09:00:00Z`. */
  readonly committedAt: string;
  /** Made although required records are missing, stale or contradicted; every page says so. */
  readonly draft: boolean;
  /** In code-unit order of the manifests' paths. */
  readonly studies: readonly DossierStudy[];
  readonly verdict: Verdict;
  /** Of the revision; open while the dossier is made. */
  readonly snapshot: Snapshot;
}

/** A file of the dossier, ready to be written; text is UTF-8. */
export interface DossierFile {
  /** With `/`, from the dossier's own top. */
  readonly path: string;
  readonly content: string | Uint8Array;
}
