/** A published way to document models, with the places in a manifest that answer each of its elements. */
export interface Framework {
  readonly name: string;
  /** The full citation. */
  readonly source: string;
  /** What a reader must know of how the elements were taken from it. */
  readonly note?: string | undefined;
  readonly elements: readonly FrameworkElement[];
}

export interface FrameworkElement {
  /** As the framework numbers it; its place where it has no numbers. */
  readonly id: string;
  readonly title: string;
  /**
   * Fields that answer it, from a record's area on: `study.purpose`, `inputs.source` (of every input), `evaluation`
   * (the whole record).
   */
  readonly answered_by: readonly string[];
}
