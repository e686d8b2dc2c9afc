import { isScalar, isSeq, parseDocument, type Scalar } from 'yaml';

export type ScalarValue = string | number | boolean;

/** A number with the decimals that it was rounded to. */
export interface Rounded {
  readonly value: number;
  readonly decimals: number;
}

/** A value as YAML; in the manner of the scalar that it takes the place of, if there is one. */
export function scalarText(value: ScalarValue | Rounded, old?: Scalar): string {
  // 1.00 is another statement than 1: it says that a figure of 0.97 would have been seen.
  if (typeof value === 'object') return value.value.toFixed(value.decimals);
  if (old?.value === value && old.type === 'PLAIN') return old.source ?? String(value);
  if (typeof value === 'number') return numberText(value, old?.source);
  if (typeof value === 'boolean') return String(value);
  if (old?.type === 'QUOTE_SINGLE' && !/\p{Cc}/u.test(value)) return `'${value.replaceAll("'", "''")}'`;
  if ((old?.type ?? 'PLAIN') === 'PLAIN' && isPlain(value)) return value;
  return JSON.stringify(value);
}

export function writtenKey(key: string): string {
  return isPlain(key) ? key : JSON.stringify(key);
}

/** With as many decimals as before, if that loses nothing. */
function numberText(value: number, before = ''): string {
  const decimals = /\.(\d+)$/.exec(before)?.[1]?.length ?? 0;
  const fixed = value.toFixed(Math.min(decimals, 100));
  return Number(fixed) === value ? fixed : String(value);
}

/** Whether a text means itself without quotes, inside brackets too. */
function isPlain(text: string): boolean {
  const { errors, contents } = parseDocument(`[${text}]`, { schema: 'core' });
  const [item, ...more] = isSeq(contents) ? contents.items : [];
  return (
    errors.length === 0 && more.length === 0 && isScalar(item) && item.type === 'PLAIN' && item.value === text
  );
}
