import type { DossierContent, DossierStudy } from '../content.ts';

/** What a section is written from. */
export interface Subject extends DossierStudy {
  readonly content: DossierContent;
  /** Begins every `id` of the study's part of the page. */
  readonly key: string;
  /** Columns that long lines are thinned to: fewer where there are many targets, so that the page stays small. */
  readonly columns: number;
}

/** Twice what a screen draws. */
export const manyColumns = 692;
