import { figure } from '../../rules/figures.ts';
import { axes, cross, dot, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { type Drawing, inPlot, upwards } from './hydrograph.ts';
import { element, short } from './markup.ts';
import { extentOf, linear, type Scale } from './scales.ts';
import type { Cloud } from './scatter.ts';

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** Means of the twelve calendar months, January first. */
export function seasonCycle({ observed, simulated }: Cloud, of: Drawing): Chart | null {
  const extent = extentOf(observed, simulated);
  if (extent === null) return null;
  const yScale = linear({ from: Math.min(0, extent.from), to: extent.to }, upwards);
  const place = (month: number) => inPlot.from + ((month + 0.5) * (inPlot.to - inPlot.from)) / 12;
  const highest = (side: ArrayLike<number>) => {
    const values = Array.from(side);
    return months[values.indexOf(Math.max(...values))] ?? '';
  };
  const largest = Math.max(
    ...Array.from(observed, (value, month) => Math.abs((simulated[month] ?? Number.NaN) - value)),
  );
  return chart(
    {
      title: `${of.name}: mean of each calendar month`,
      summary: `Highest in ${highest(observed)} observed and in ${highest(simulated)} simulated; months differ by up to ${figure(largest)}.`,
      source: of.source,
    },
    plotHeight,
    axes({
      xLabel: 'Month',
      yLabel: of.quantity,
      xTicks: months.map((text, month) => ({ at: place(month), text })),
      yTicks: yScale.ticks,
      legend: [
        { mark: 'observed', shape: 'line', text: 'observed (thick, dots)' },
        { mark: 'simulated dashed', shape: 'line', text: 'simulated (dashed, crosses)' },
      ],
    }) +
      element('path', { class: 'observed', d: path(observed, place, yScale) }) +
      element('path', { class: 'dots big first', d: marks(observed, place, yScale, dot) }) +
      element('path', { class: 'simulated dashed', d: path(simulated, place, yScale) }) +
      element('path', { class: 'crosses second', d: marks(simulated, place, yScale, cross) }),
  );
}

function path(values: ArrayLike<number>, place: (month: number) => number, yScale: Scale): string {
  return Array.from(
    values,
    (value, month) => `${month === 0 ? 'M' : 'L'}${short(place(month))} ${short(yScale(value))}`,
  ).join('');
}

function marks(
  values: ArrayLike<number>,
  place: (month: number) => number,
  yScale: Scale,
  mark: (x: number, y: number) => string,
): string {
  return Array.from(values, (value, month) => mark(place(month), yScale(value))).join('');
}
