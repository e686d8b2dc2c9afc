import type { Chart } from '../charts/chart.ts';

/** A piece of a line. Strings are shown as they are, whatever they hold. */
export type Piece =
  | string
  /** A path, digest, command or name. */
  | { readonly code: string }
  | { readonly strong: string }
  /** A small drawing, with what it says. */
  | { readonly svg: string; readonly text: string };

export type Text = Piece | readonly Piece[];

/** One part of the page; HTML and Markdown are both made of these, so that they say the same. */
export type Block =
  /** Level 1 is a section, 2 a part of it; `id` is none twice. */
  | { readonly kind: 'heading'; readonly level: number; readonly text: string; readonly id: string }
  | { readonly kind: 'paragraph'; readonly text: Text; readonly tone?: 'caution' | 'draft' | 'good' | 'bad' }
  | { readonly kind: 'list'; readonly items: readonly Text[] }
  | { readonly kind: 'facts'; readonly entries: readonly (readonly [name: string, text: Text])[] }
  | {
      readonly kind: 'table';
      readonly caption: string;
      readonly head: readonly string[];
      readonly rows: readonly (readonly Text[])[];
    }
  | { readonly kind: 'figures'; readonly charts: readonly Chart[] }
  /** Lines for a shell. */
  | { readonly kind: 'commands'; readonly lines: readonly string[] };

export interface Page {
  readonly title: string;
  readonly draft: boolean;
  /** Printed at the foot of each page. */
  readonly foot: string;
  readonly blocks: readonly Block[];
}

export function heading(level: number, text: string, id: string): Block {
  return { kind: 'heading', level, text, id };
}

export function paragraph(text: Text): Block {
  return { kind: 'paragraph', text };
}

/** Figures that could be drawn; nothing where none could. */
export function figures(...charts: readonly (Chart | null)[]): readonly Block[] {
  const drawn = charts.filter((chart) => chart !== null);
  return drawn.length === 0 ? [] : [{ kind: 'figures', charts: drawn }];
}

/** A table, or a sentence where it would have no rows. */
export function tableOr(
  none: string,
  caption: string,
  head: readonly string[],
  rows: readonly (readonly Text[])[],
): Block {
  return rows.length === 0 ? paragraph(none) : { kind: 'table', caption, head, rows };
}

/** Entries that say something; those without a text are left out. */
export function facts(
  ...entries: readonly (readonly [name: string, text: Text | null | undefined])[]
): readonly Block[] {
  const said = entries.flatMap(([name, text]) =>
    text == null || text === '' ? [] : [[name, text] as const],
  );
  return said.length === 0 ? [] : [{ kind: 'facts', entries: said }];
}

export function pieces(text: Text): readonly Piece[] {
  return Array.isArray(text) ? text : [text as Piece];
}
