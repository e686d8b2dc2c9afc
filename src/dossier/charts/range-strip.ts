import { figure } from '../../rules/figures.ts';
import { element, escaped, short } from './markup.ts';

export interface InRange {
  readonly lower: number;
  readonly upper: number;
  /** From 0 at the lower end to 1 at the upper; beyond these outside. */
  readonly position: number;
  /** The same of the value that the calibration began with; null where it is not known. */
  readonly began: number | null;
}

/** A strip for a table's cell: the range, where the calibration began (bar) and where it ended (lozenge). */
export function rangeStrip({ lower, upper, position, began }: InRange): {
  readonly svg: string;
  readonly text: string;
} {
  const percent = Math.round(position * 100);
  const text = `at ${percent} % of the way from ${figure(lower)} to ${figure(upper)}`;
  const place = (share: number) => 8 + Math.min(1.04, Math.max(-0.04, share)) * 104;
  const at = short(place(position));
  const svg = element(
    'svg',
    { class: 'strip', viewBox: '0 0 120 16', role: 'img' },
    `<title>${escaped(text)}</title>` +
      element('path', { class: 'axis', d: 'M8 8H112M8 4v8M112 4v8' }) +
      (began === null
        ? ''
        : element('path', { class: 'reference solid', d: `M${short(place(began))} 3v10` })) +
      element('path', {
        class: position < 0 || position > 1 ? 'lozenge outside' : 'lozenge',
        d: `M${at} 2l5 6l-5 6l-5-6z`,
      }),
  );
  return { svg, text: `${percent} %` };
}
