/** What is wrong with a package, file by file. */
export interface PackageProblem {
  /** `broken`: says something untrue, or is dangerous to unpack. `incomplete`: something is missing or unlisted. */
  readonly kind: 'broken' | 'incomplete';
  readonly file: string;
  readonly message: string;
}

/** What became of a package that was read back. */
export interface PackageReport {
  readonly status: 'valid' | 'awaiting fetch' | 'incomplete' | 'broken';
  /** Broken ones first, then in code-unit order of file. */
  readonly problems: readonly PackageProblem[];
  /** Files that are to be fetched before the package is whole, with their addresses. */
  readonly awaited: readonly { readonly file: string; readonly url: string }[];
  /** What was not checked, and why. */
  readonly notes: readonly string[];
  /** Files whose digests were computed. */
  readonly read: number;
}

/** How much of a package is taken in before it counts as an attack. */
export interface Limits {
  readonly entries: number;
  /** Of one document that is read as text. */
  readonly textBytes: number;
  /** An archive may grow to this many bytes, or to `growth` times its own size, whichever is more. */
  readonly grownBytes: number;
  readonly growth: number;
}

export const ordinaryLimits: Limits = {
  entries: 200_000,
  textBytes: 64 * 1024 * 1024,
  grownBytes: 1024 * 1024 * 1024,
  growth: 200,
};
