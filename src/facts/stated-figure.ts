import { isDefined, type Statistic } from '../hydrology/paired.ts';
import { agreesAsPrinted, type PrintedNumber, printedNumber } from '../hydrology/stated/printed-number.ts';
import type { FieldPath, Manifest } from '../manifest/manifest.ts';
import type { RecordNode } from '../records/record.ts';
import type { Figure } from './figures.ts';

/** A figure as a record states it, beside what the files give. */
export interface ComparedFigure {
  /** Its key, such as `runoff_ratio`; for a total `totals` and the term's name. */
  readonly name: string;
  readonly field: FieldPath;
  /** With the decimals that are written. */
  readonly printed: PrintedNumber;
  readonly recomputed: Statistic;
  readonly agrees: boolean;
  /** Windows that give just the stated figure, where it does not agree. */
  readonly windows: readonly string[];
}

/** What may be found over other windows than the stated one, by the window's name in words. */
export type Elsewhere = ReadonlyMap<string, ReadonlyMap<string, Statistic>>;

/** The figures below a field, held against what was found by the same names. */
export function compareFigures(
  stated: object | undefined,
  base: FieldPath,
  found: ReadonlyMap<string, Statistic> | { readonly undefined: string },
  manifest: Manifest,
): readonly ComparedFigure[] {
  return numbersIn(stated ?? {}, base).flatMap(({ field, value }) => {
    const printed = printedNumber(manifest.source(field) ?? String(value));
    if (printed === null) return [];
    const name = field.slice(base.length).join(' ');
    const recomputed =
      found instanceof Map
        ? (found.get(name) ?? { undefined: 'no such term is named' })
        : (found as { readonly undefined: string });
    return { name, field, printed, recomputed, agrees: fits(printed, recomputed), windows: [] };
  });
}

/** The same with the windows named that give a stated figure which the right one does not. */
export function withWindows(
  figures: readonly ComparedFigure[],
  elsewhere: Elsewhere,
): readonly ComparedFigure[] {
  return figures.map((figure) =>
    figure.agrees
      ? figure
      : {
          ...figure,
          windows: [...elsewhere].flatMap(([window, found]) => {
            const there = found.get(figure.name);
            return there !== undefined && fits(figure.printed, there) ? window : [];
          }),
        },
  );
}

function fits(printed: PrintedNumber, recomputed: Statistic): boolean {
  return isDefined(recomputed) && agreesAsPrinted({ stated: printed, recomputed: recomputed.value });
}

function numbersIn(node: object, field: FieldPath): readonly { field: FieldPath; value: number }[] {
  return Object.entries(node).flatMap(([key, value]) => {
    const place = [...field, key];
    if (typeof value === 'object' && value !== null) return numbersIn(value, place);
    return typeof value === 'number' ? { field: place, value } : [];
  });
}

/** Whether every figure that is stated is what the files give, and some are. */
export function allAgree(stated: readonly ComparedFigure[]): boolean {
  return stated.length > 0 && stated.every(({ agrees }) => agrees);
}

/**
 * What `seal --figures` writes: stated figures that the files give otherwise, to the decimals that are written; where none is
 * stated, the usual ones, each with its decimals. Nothing for a fragment that stands for many records.
 */
export function figuresOf(
  { id, name, field }: RecordNode,
  base: FieldPath,
  stated: readonly ComparedFigure[],
  found: ReadonlyMap<string, Statistic>,
  usual: Readonly<Record<string, number>>,
): readonly Figure[] {
  if (name !== null && field.at(-1) !== name) return [];
  const differing = stated.filter(({ agrees }) => !agrees);
  const wanted =
    stated.length > 0
      ? differing.map((one) => ({ ...one, stated: one.printed.value, decimals: one.printed.decimals }))
      : Object.entries(usual).map(([key, decimals]) => ({
          field: [...base, key],
          stated: null,
          decimals,
          recomputed: found.get(key) ?? { undefined: 'not computed' },
        }));
  return wanted.flatMap(({ field: place, stated: before, decimals, recomputed }) => {
    if (!isDefined(recomputed)) return [];
    const shown = Math.min(100, Math.max(0, decimals));
    // Adding zero makes of -0 what people write.
    const rounded = Number(recomputed.value.toFixed(shown)) + 0;
    return { record: id, field: place, stated: before, found: rounded, decimals: shown };
  });
}
