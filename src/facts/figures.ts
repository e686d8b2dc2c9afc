import type { FieldPath } from '../manifest/manifest.ts';
import { balanceFiguresToWrite } from './balances.ts';
import { bandFiguresToWrite } from './bands.ts';
import { conditionFiguresToWrite } from './condition-figures.ts';
import type { Facts } from './facts.ts';
import { missingShareFigures } from './missing-shares.ts';
import { scoreFigures } from './score-figures.ts';

/** A figure that the files give otherwise than the manifest states it. */
export interface Figure {
  readonly record: string;
  readonly field: FieldPath;
  /** Null where nothing is stated. */
  readonly stated: number | null;
  /** Rounded to the decimals that are stated, at least to those that are usual. */
  readonly found: number;
  /** With which it is written; without them, with those of the stated figure, or as few as it needs. */
  readonly decimals?: number;
}

/** What `seal --figures` writes into the manifest, record after record. */
export function figuresToWrite(facts: Facts): readonly Figure[] {
  return [
    ...missingShareFigures(facts),
    ...scoreFigures(facts),
    ...balanceFiguresToWrite(facts),
    ...bandFiguresToWrite(facts),
    ...conditionFiguresToWrite(facts),
  ];
}
