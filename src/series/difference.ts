/** How a series changed between two versions of its file. Figures run over values that are present and finite. */
export interface SeriesDifference {
  /** Values in the new file. */
  readonly values: number;
  /** Values that differ, were added or were removed. */
  readonly changed: number;
  readonly totalBefore: number;
  readonly totalAfter: number;
  /** First and last time step touched, as written for people (`2007-01-14`); null when no value changed (only text did). */
  readonly first: string | null;
  readonly last: string | null;
  readonly unit: string;
}
