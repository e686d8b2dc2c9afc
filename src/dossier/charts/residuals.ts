import type { Paired } from '../../hydrology/paired.ts';
import { figure } from '../../rules/figures.ts';
import { axes, plot, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { type Drawing, inPlot, upwards } from './hydrograph.ts';
import { element } from './markup.ts';
import { extentOf, linear, overDays } from './scales.ts';
import { linePath } from './thin.ts';

/** Simulated less observed over time. Null without pairs. */
export function residuals(
  pairs: Pick<Paired, 'observed' | 'simulated' | 'times'>,
  longestStep: number,
  of: Drawing,
): Chart | null {
  const { observed, simulated, times } = pairs;
  const differences = simulated.map((value, place) => value - (observed[place] as number));
  const extent = extentOf(differences);
  const days = extentOf(times);
  if (extent === null || days === null) return null;
  const yScale = linear({ from: Math.min(0, extent.from), to: Math.max(0, extent.to) }, upwards);
  const xScale = overDays(days, inPlot);
  const zero = yScale(0);
  const line = linePath(
    { x: times, y: differences },
    { xScale, yScale, plot: inPlot, columns: of.columns, longestStep },
  );
  return chart(
    {
      title: `${of.name}: residuals over time`,
      summary: `Simulated less observed, ${figure(extent.from)} to ${figure(extent.to)}; above the line at zero the model gives too much.`,
      source: of.source,
    },
    plotHeight,
    axes({
      xLabel: 'Date',
      yLabel: `Simulated less observed: ${of.quantity}`,
      xTicks: xScale.ticks,
      yTicks: yScale.ticks,
      legend: [
        { mark: 'simulated', shape: 'line', text: 'residual' },
        { mark: 'reference', shape: 'line', text: 'no difference' },
      ],
    }) +
      element('path', { class: 'simulated', d: line }) +
      element('path', { class: 'reference', d: `M${plot.left} ${zero.toFixed(1)}H${plot.right}` }),
  );
}
