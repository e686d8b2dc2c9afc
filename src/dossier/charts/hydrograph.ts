import { figure } from '../../rules/figures.ts';
import { axes, plot, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { element } from './markup.ts';
import { extentOf, linear, logarithmic, overDays } from './scales.ts';
import { areaPath, type Line, linePath, type Thinning } from './thin.ts';

/** Lines over time in days since 1970-01-01; all values in one unit. */
export interface OverTime {
  readonly observed: Line;
  readonly simulated: Line;
  /** Null where there is none. */
  readonly band: {
    readonly x: ArrayLike<number>;
    readonly lower: ArrayLike<number>;
    readonly upper: ArrayLike<number>;
  } | null;
  /** Longest way between two values that a line crosses, in days. */
  readonly longestStep: number;
}

export interface Drawing {
  /** The name of the target. */
  readonly name: string;
  /** Variable with its unit, such as `Streamflow, m3/s`. */
  readonly quantity: string;
  readonly source: string;
  /** Columns that long lines are thinned to. */
  readonly columns: number;
}

export const inPlot = { from: plot.left, to: plot.right };
export const upwards = { from: plot.bottom, to: plot.top };

/** Observed and simulated values over time with the band; on a logarithmic scale values at or below zero can't be drawn. Null without values to draw. */
export function hydrograph(
  series: OverTime,
  of: Drawing,
  scale: 'linear' | 'logarithmic',
  when = 'observed and simulated over time',
): Chart | null {
  const { observed, simulated, band, longestStep } = scale === 'linear' ? series : aboveZero(series);
  const values = extentOf(observed.y, simulated.y, band?.lower ?? [], band?.upper ?? []);
  const days = extentOf(observed.x, simulated.x);
  if (values === null || days === null) return null;
  const yScale =
    scale === 'linear'
      ? linear({ from: Math.min(0, values.from), to: values.to }, upwards)
      : logarithmic(values, upwards);
  const xScale = overDays(days, inPlot);
  const how: Thinning = { xScale, yScale, plot: inPlot, columns: of.columns, longestStep };
  const area = band === null ? '' : element('path', { class: 'band', d: areaPath(band.x, band, how) });
  const drawn =
    axes({
      xLabel: 'Date',
      yLabel: of.quantity,
      xTicks: xScale.ticks,
      yTicks: yScale.ticks,
      legend: [
        { mark: 'observed', shape: 'line', text: 'observed (thick)' },
        { mark: 'simulated', shape: 'line', text: 'simulated (thin)' },
        ...(band === null ? [] : [{ mark: 'band', shape: 'area' as const, text: 'band' }]),
      ],
    }) +
    area +
    element('path', { class: 'observed', d: linePath(observed, how) }) +
    element('path', { class: 'simulated', d: linePath(simulated, how) });
  const range = (line: Line) => {
    const extent = extentOf(line.y);
    return extent === null ? 'no values' : `${figure(extent.from)} to ${figure(extent.to)}`;
  };
  return chart(
    {
      title: `${of.name}: ${when}, ${scale} scale`,
      summary: `Observed ${range(observed)}, simulated ${range(simulated)}${band === null ? '' : '; shaded: the uncertainty band'}.`,
      source: of.source,
    },
    plotHeight,
    drawn,
  );
}

function aboveZero({ observed, simulated, band, longestStep }: OverTime): OverTime {
  const positive = (values: ArrayLike<number>) =>
    Float64Array.from(values, (value) => (value > 0 ? value : Number.NaN));
  const line = ({ x, y }: Line): Line => ({ x, y: positive(y) });
  return {
    observed: line(observed),
    simulated: line(simulated),
    band: band === null ? null : { x: band.x, lower: positive(band.lower), upper: positive(band.upper) },
    longestStep,
  };
}
