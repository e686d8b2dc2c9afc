import { chartWidth } from './chart.ts';
import { element, label, shortened } from './markup.ts';

export interface Tick {
  /** In the drawing's units. */
  readonly at: number;
  readonly text: string;
}

export interface AxesOf {
  /** With its unit. */
  readonly xLabel: string;
  readonly yLabel: string;
  readonly xTicks: readonly Tick[];
  readonly yTicks: readonly Tick[];
  readonly legend: readonly LegendEntry[];
}

/** A mark as the drawing has it, and what it stands for. */
export interface LegendEntry {
  /** Class of the mark. */
  readonly mark: string;
  readonly shape: 'line' | 'area' | 'dot' | 'cross' | 'lozenge';
  readonly text: string;
}

/** Where the plot lies. */
export const plot = { left: 46, right: chartWidth - 8, top: 44, bottom: 226 } as const;
export const plotHeight = 264;
/** Of the widest common letters, so that what is drawn fits whatever the reader has. */
const letterWidth = 6.5;
const digitWidth = 7.2;

/** Grid, ticks, both labels and the legend of a plot. */
export function axes({ xLabel, yLabel, xTicks, yTicks, legend }: AxesOf): string {
  const { left, right, top, bottom } = plot;
  return [
    legendRow(legend, 12),
    label(0, 32, shortened(yLabel, 62), { class: 'axis-name' }),
    ...yTicks.map(
      ({ at, text }) =>
        element('path', { class: 'grid', d: `M${left} ${at.toFixed(1)}H${right}` }) +
        label(left - 5, at + 4, text, { class: 'tick', 'text-anchor': 'end' }),
    ),
    ...xTicks.map(
      ({ at, text }) =>
        element('path', { class: 'grid', d: `M${at.toFixed(1)} ${bottom}v4` }) +
        tickLabel({ at, text }, bottom + 16),
    ),
    element('path', { class: 'axis', d: `M${left} ${top}V${bottom}H${right}` }),
    label(right, bottom + 34, shortened(xLabel, 58), { class: 'axis-name', 'text-anchor': 'end' }),
  ].join('');
}

/** Marks with their names in one row. */
export function legendRow(entries: readonly LegendEntry[], y: number): string {
  let x = 0;
  return entries
    .map(({ mark, shape, text }) => {
      const at = x;
      x += 24 + text.length * letterWidth + 10;
      return sample(shape, mark, at, y) + label(at + 23, y, text, { class: 'key' });
    })
    .join('');
}

function sample(shape: LegendEntry['shape'], mark: string, x: number, y: number): string {
  const middle = y - 4;
  if (shape === 'line') return element('path', { class: mark, d: `M${x} ${middle}h18` });
  if (shape === 'area') return element('path', { class: mark, d: `M${x} ${middle - 5}h18v10h-18z` });
  if (shape === 'lozenge') return element('path', { class: mark, d: lozenge(x + 9, middle) });
  return element('path', { class: mark, d: shape === 'dot' ? dot(x + 9, middle) : cross(x + 9, middle) });
}

/** The text of a tick on a lying axis, moved inwards where it would be cut. */
export function tickLabel({ at, text }: Tick, y: number): string {
  const half = (text.length * digitWidth) / 2 + 1;
  const x = Math.min(Math.max(at, half), chartWidth - half);
  return label(x, y, text, { class: 'tick', 'text-anchor': 'middle' });
}

export function lozenge(x: number, y: number): string {
  return `M${Math.round(x * 10) / 10} ${Math.round(y * 10) / 10 - 7}l6 7l-6 7l-6-7z`;
}

/** A dot by its stroke alone: the shortest way to write one. */
export function dot(x: number, y: number): string {
  return `M${Math.round(x * 10) / 10} ${Math.round(y * 10) / 10}h0`;
}

export function cross(x: number, y: number): string {
  const [left, top] = [Math.round(x * 10) / 10 - 3, Math.round(y * 10) / 10 - 3];
  return `M${left} ${top}l6 6m0-6l-6 6`;
}
