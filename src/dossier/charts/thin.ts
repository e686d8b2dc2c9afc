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
 * that every peak and every trough is drawn. A line with no more values than that is drawn whole. A value between gaps is a dot.
 * Method: M4, Jugel et al. 2014, Proc. VLDB Endowment 7(10):797-808.
 */
export function linePath(line: Line, { xScale, yScale, plot, columns, longestStep }: Thinning): string {
  const { x, y } = line;
  const isWhole = x.length <= columns * 2;
  const width = (plot.to - plot.from) / columns;
  const columnOf = (row: number) => Math.floor((xScale(x[row] as number) - plot.from) / width);
  let path = '';
  let row = 0;
  while (row < x.length) {
    if (!Number.isFinite(y[row])) {
      row++;
      continue;
    }
    let end = row + 1;
    while (
      end < x.length &&
      Number.isFinite(y[end]) &&
      (x[end] as number) - (x[end - 1] as number) <= longestStep
    )
      end++;
    path += isWhole ? wholeRun(line, row, end, xScale, yScale) : thinnedRun(row, end);
    row = end;
  }
  return path;

  function thinnedRun(from: number, until: number): string {
    let run = '';
    let at = from;
    while (at < until) {
      const column = columnOf(at);
      let [lowest, highest, last] = [at, at, at];
      for (let next = at + 1; next < until && columnOf(next) === column; next++) {
        if ((y[next] as number) < (y[lowest] as number)) lowest = next;
        if ((y[next] as number) > (y[highest] as number)) highest = next;
        last = next;
      }
      const rows = [...new Set([at, Math.min(lowest, highest), Math.max(lowest, highest), last])];
      const levels = rows.map((one) => short(yScale(y[one] as number)));
      const distinct = levels.filter((level, place) => place === 0 || level !== levels[place - 1]);
      const [first = '', ...more] = distinct;
      run += `${at === from ? 'M' : 'L'}${short(plot.from + (column + 0.5) * width)} ${first}`;
      run += more.map((level) => `V${level}`).join('');
      at = last + 1;
    }
    return until - from === 1 ? `${run}h0` : run;
  }
}

function wholeRun({ x, y }: Line, from: number, end: number, xScale: Scale, yScale: Scale): string {
  let run = '';
  for (let row = from; row < end; row++)
    run += `${row === from ? 'M' : 'L'}${short(xScale(x[row] as number))} ${short(yScale(y[row] as number))}`;
  return end - from === 1 ? `${run}h0` : run;
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
