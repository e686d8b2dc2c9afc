import { type Chart, chart, chartWidth } from './chart.ts';
import { element, label, shortened } from './markup.ts';

/** One record, or several of one fragment, as a row of the picture. */
export interface RestingRow {
  readonly name: string;
  /** The worst state among them. */
  readonly state: string;
}

/** Row `from` rests on row `to`, by their places. */
export interface RestsOn {
  readonly from: number;
  readonly to: number;
  readonly isStale: boolean;
}

const rowHeight = 20;
const top = 30;
const textEnd = 252;
/** Letters of a row, bold ones too, that fit before the arcs. */
const mostLetters = 31;

/** Records one below the other, each joined by an arc to those that it rests on. Null without records. */
export function restsOnPicture(
  rows: readonly RestingRow[],
  edges: readonly RestsOn[],
  of: { readonly title: string; readonly source: string },
): Chart | null {
  if (rows.length === 0) return null;
  const middle = (place: number) => top + place * rowHeight + rowHeight / 2;
  const lane = (edge: RestsOn) => {
    const share = Math.abs(edge.from - edge.to) / Math.max(1, rows.length - 1);
    return textEnd + 14 + Math.sqrt(share) * (chartWidth - textEnd - 26);
  };
  const arc = (edge: RestsOn) => {
    const [y, to, x] = [middle(edge.from), middle(edge.to), Math.round(lane(edge))];
    return `M${textEnd} ${y}C${x} ${y} ${x} ${to} ${textEnd + 6} ${to}`;
  };
  const tip = ({ to }: RestsOn) => `M${textEnd + 7} ${middle(to) - 3}l-6 3l6 3z`;
  const [stale, holding] = [edges.filter(({ isStale }) => isStale), edges.filter(({ isStale }) => !isStale)];
  const drawn = rows.map(({ name, state }, place) => {
    const y = middle(place);
    const isSound = state === 'sound';
    const told = isSound ? '' : ` (${state})`;
    const text = shortened(name, mostLetters - told.length) + told;
    return (
      element('path', {
        class: isSound ? 'node' : 'node unsound',
        d: isSound ? `M4 ${y - 5}h10v10h-10z` : `M9 ${y - 6}l6 11h-12z`,
      }) +
      label(20, y + 4, text, { class: isSound ? 'key' : 'key unsound' }) +
      element('path', {
        class: 'grid',
        d: `M${Math.min(textEnd - 4, 28 + text.length * (isSound ? 6.5 : 7.3))} ${y}H${textEnd}`,
      })
    );
  });
  const unsound = rows.filter(({ state }) => state !== 'sound');
  return chart(
    {
      title: of.title,
      summary: `${rows.length} rows; an arc leads from a record to each that it rests on${unsound.length === 0 ? '; no path is stale' : `; not sound: ${unsound.map(({ name, state }) => `${name} (${state})`).join(', ')}`}.`,
      source: of.source,
    },
    top + rows.length * rowHeight + 6,
    element('path', { class: 'arc', d: 'M4 10h18' }) +
      label(27, 14, 'rests on', { class: 'key' }) +
      element('path', { class: 'arc stale', d: 'M96 10h18' }) +
      label(119, 14, 'stale path (dashed)', { class: 'key' }) +
      element('path', { class: 'node', d: 'M252 5h10v10h-10z' }) +
      label(267, 14, 'sound', { class: 'key' }) +
      element('path', { class: 'node unsound', d: 'M324 4l6 11h-12z' }) +
      label(334, 14, 'not sound', { class: 'key' }) +
      drawn.join('') +
      element('path', { class: 'arc', d: holding.map(arc).join('') }) +
      element('path', { class: 'arc stale', d: stale.map(arc).join('') }) +
      element('path', { class: 'tip', d: edges.map(tip).join('') }),
  );
}
