import { element, escaped } from './markup.ts';

/** A figure of the dossier: a drawing with all that is said with it. */
export interface Chart {
  readonly title: string;
  /** What the figure shows, in figures and words, for those who don't see it. */
  readonly summary: string;
  /** Records and files that it is drawn from. */
  readonly source: string;
  /** One `svg` element, coloured by the page's style. */
  readonly svg: string;
}

/** Width of every drawing in its own units; small enough that its letters can be read on a telephone. */
export const chartWidth = 400;

/** Puts a drawing together with its text alternative. */
export function chart(of: Omit<Chart, 'svg'>, height: number, drawn: string): Chart {
  const spoken = `<title>${escaped(of.title)}</title><desc>${escaped(of.summary)}</desc>`;
  const attributes = { class: 'chart', viewBox: `0 0 ${chartWidth} ${Math.ceil(height)}`, role: 'img' };
  return { ...of, svg: element('svg', attributes, spoken + drawn) };
}
