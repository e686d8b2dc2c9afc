import { short } from './markup.ts';
import type { Scale, Span } from './scales.ts';

/** A line over time: `x` rises, `y` is NaN where there is no value. */
export interface Line {
  readonly x: ArrayLike<number>;
  readonly y: ArrayLike<number>;
}

export interface Thinning {
  readonly xScale: Scale;
  readonly yScale: Scale;
  /** In the drawing's units. */
  readonly plot: Span;
  readonly columns: number;
  /** A longer way between two values of `x` than this is a gap, which no line crosses. */
  readonly longestStep: number;
}

/**
 * The path of a line, thinned to the first, lowest, highest and last value of each column of the drawing, in order of time, so
 * that every peak and every trough is drawn. A line with no more values than that is drawn whole. Gaps are left open where a
 * drawing can show them: those wider than a column. A value between gaps is a dot.
 * Method: M4, Jugel et al. 2014, Proc. VLDB Endowment 7(10):797-808.
 */
export function linePath(line: Line, how: Thinning): string {
  const { x, y } = line;
  const { xScale, plot, columns, longestStep } = how;
  const isWhole = x.length <= columns * 2;
  const columnWidth = (plot.to - plot.from) / columns / (xScale(1) - xScale(0));
  const widest = isWhole ? longestStep : Math.max(longestStep, columnWidth);
  let path = '';
  let run: number[] = [];
  const finish = () => {
    path += isWhole ? wholeRun(line, run, how) : thinnedRun(line, run, how);
    if (run.length === 1) path += 'h0';
    run = [];
  };
  for (let row = 0; row < x.length; row++) {
    if (!Number.isFinite(y[row])) continue;
    const before = run.at(-1);
    if (before !== undefined && (x[row] as number) - (x[before] as number) > widest) finish();
    run.push(row);
  }
  finish();
  return path;
}

function wholeRun({ x, y }: Line, rows: readonly number[], { xScale, yScale }: Thinning): string {
  return rows
    .map(
      (row, place) =>
        `${place === 0 ? 'M' : 'L'}${short(xScale(x[row] as number))} ${short(yScale(y[row] as number))}`,
    )
    .join('');
}

function thinnedRun(
  { x, y }: Line,
  rows: readonly number[],
  { xScale, yScale, plot, columns }: Thinning,
): string {
  const width = (plot.to - plot.from) / columns;
  const columnOf = (row: number) => Math.floor((xScale(x[row] as number) - plot.from) / width);
  let path = '';
  for (let at = 0; at < rows.length; ) {
    const first = rows[at] as number;
    const column = columnOf(first);
    let [lowest, highest, last] = [first, first, first];
    for (; at < rows.length && columnOf(rows[at] as number) === column; at++) {
      last = rows[at] as number;
      if ((y[last] as number) < (y[lowest] as number)) lowest = last;
      if ((y[last] as number) > (y[highest] as number)) highest = last;
    }
    const inOrder = [first, Math.min(lowest, highest), Math.max(lowest, highest), last];
    const levels = inOrder.map((row) => short(yScale(y[row] as number)));
    const [begin = '', ...more] = levels.filter((level, place) => level !== levels[place - 1]);
    path += `${path === '' ? 'M' : 'L'}${short(plot.from + (column + 0.5) * width)} ${begin}`;
    path += more.map((level) => `V${level}`).join('');
  }
  return path;
}

/** The area between two lines of the same times, thinned to the widest of each column. */
export function areaPath(
  x: ArrayLike<number>,
  { lower, upper }: { readonly lower: ArrayLike<number>; readonly upper: ArrayLike<number> },
  { xScale, yScale, plot, columns }: Thinning,
): string {
  const width = (plot.to - plot.from) / columns;
  const ends = new Map<number, Span>();
  for (let row = 0; row < x.length; row++) {
    const [low, high] = [lower[row] as number, upper[row] as number];
    if (!Number.isFinite(low) || !Number.isFinite(high)) continue;
    const column = Math.floor((xScale(x[row] as number) - plot.from) / width);
    const { from, to } = ends.get(column) ?? { from: low, to: high };
    ends.set(column, { from: Math.min(from, low), to: Math.max(to, high) });
  }
  let [path, back] = ['', ''];
  const close = () => (back === '' ? '' : `${back}z`);
  let before = Number.NaN;
  for (const [column, { from, to }] of ends) {
    const left = short(plot.from + column * width);
    const right = short(plot.from + (column + 1) * width);
    const isNew = column !== before + 1;
    if (isNew) {
      path += `${close()}M${left} ${short(yScale(to))}H${right}`;
      back = '';
    } else path += `L${left} ${short(yScale(to))}H${right}`;
    back = `L${right} ${short(yScale(from))}H${left}${back}`;
    before = column;
  }
  return path + close();
}
