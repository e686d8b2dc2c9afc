import { type LegendEntry, legendRow, tickLabel } from './axes.ts';
import { type Chart, chart, chartWidth } from './chart.ts';
import { element, label, short, shortened } from './markup.ts';
import { extentOf, overDays } from './scales.ts';

/** Days since 1970-01-01; `to` is the end of the last day. */
export interface Stretch {
  readonly from: number;
  readonly to: number;
}

export interface BarRow {
  readonly name: string;
  /** Class of its bars: `bar`, `bar pale`, `bar hollow`. */
  readonly mark: string;
  readonly stretches: readonly Stretch[];
  /** Stretches without values inside them. */
  readonly gaps: readonly Stretch[];
}

const rowHeight = 30;
const top = 24;
const left = 4;
const right = chartWidth - 8;

/** Rows of bars over one line of time, each below its name; gaps are drawn as cuts with a tick below. Null without bars. */
export function barsOverTime(
  rows: readonly BarRow[],
  of: {
    readonly title: string;
    readonly summary: string;
    readonly source: string;
    readonly legend: readonly LegendEntry[];
  },
): Chart | null {
  const days = extentOf(rows.flatMap(({ stretches }) => stretches.flatMap(({ from, to }) => [from, to])));
  if (days === null) return null;
  const xScale = overDays(days, { from: left, to: right });
  const bottom = top + rows.length * rowHeight + 4;
  const drawn = rows.map(({ name, mark, stretches, gaps }, place) => {
    const y = top + place * rowHeight;
    const bars = stretches
      .map(
        ({ from, to }) =>
          `M${short(xScale(from))} ${y + 16}H${short(Math.max(xScale(to), xScale(from) + 0.6))}v9H${short(xScale(from))}z`,
      )
      .join('');
    return (
      label(left, y + 12, shortened(name, 60), { class: 'key' }) +
      element('path', { class: mark, d: bars }) +
      element('path', { class: 'gap', d: gapPath(gaps, xScale, y + 16) })
    );
  });
  const ticks = xScale.ticks.map(
    (tick) =>
      element('path', { class: 'grid', d: `M${short(tick.at)} ${top}V${bottom + 4}` }) +
      tickLabel(tick, bottom + 16),
  );
  return chart(
    of,
    bottom + 36,
    legendRow(of.legend, 12) +
      ticks.join('') +
      drawn.join('') +
      element('path', { class: 'axis', d: `M${left} ${bottom}H${right}` }) +
      label(right, bottom + 32, 'Date', { class: 'axis-name', 'text-anchor': 'end' }),
  );
}

/** Gaps that fall on one spot of the drawing are one cut. */
function gapPath(gaps: readonly Stretch[], xScale: (day: number) => number, y: number): string {
  let path = '';
  let reached = Number.NEGATIVE_INFINITY;
  for (const { from, to } of gaps) {
    const first = Math.max(Math.round(xScale(from) * 2) / 2, reached);
    const end = Math.max(Math.ceil(xScale(to) * 2) / 2, Math.round(xScale(from) * 2) / 2 + 0.5);
    if (end <= reached) continue;
    path += `M${short(first)} ${y - 1}H${short(end)}v13H${short(first)}z`;
    reached = end;
  }
  return path;
}
