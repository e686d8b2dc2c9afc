import { figure } from '../../rules/figures.ts';
import { axes, cross, dot, plot, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { type Drawing, inPlot, upwards } from './hydrograph.ts';
import { element } from './markup.ts';
import { extentOf, linear, type Scale } from './scales.ts';

export interface Cloud {
  readonly observed: ArrayLike<number>;
  readonly simulated: ArrayLike<number>;
}

/** Simulated against observed, by window, with the line on which both are equal. Null without pairs. */
export function scatter(calibration: Cloud | null, validation: Cloud | null, of: Drawing): Chart | null {
  const clouds = [calibration, validation].filter((cloud) => cloud !== null);
  const extent = extentOf(...clouds.flatMap(({ observed, simulated }) => [observed, simulated]));
  if (extent === null) return null;
  const domain = { from: Math.min(0, extent.from), to: extent.to };
  const [xScale, yScale] = [linear(domain, inPlot), linear(domain, upwards)];
  const marks = (cloud: Cloud | null, mark: (x: number, y: number) => string) =>
    cloud === null
      ? ''
      : cells(cloud, xScale, yScale, of.columns < inPlot.to - inPlot.from ? 6 : 3)
          .map(([x, y]) => mark(x, y))
          .join('');
  const count = (cloud: Cloud | null) => figure(cloud?.observed.length ?? 0);
  return chart(
    {
      title: `${of.name}: simulated against observed`,
      summary: `${count(calibration)} pairs of calibration and ${count(validation)} of validation; marks above the line are simulated too high. Pairs that fall on one spot are one mark.`,
      source: of.source,
    },
    plotHeight,
    axes({
      xLabel: `Observed: ${of.quantity}`,
      yLabel: `Simulated: ${of.quantity}`,
      xTicks: xScale.ticks,
      yTicks: yScale.ticks,
      legend: [
        ...(calibration === null ? [] : [{ mark: 'dots first', shape: 'dot' as const, text: 'calibration' }]),
        ...(validation === null
          ? []
          : [{ mark: 'crosses second', shape: 'cross' as const, text: 'validation' }]),
        { mark: 'reference', shape: 'line', text: 'equal' },
      ],
    }) +
      element('path', { class: 'dots first', d: marks(calibration, dot) }) +
      element('path', { class: 'crosses second', d: marks(validation, cross) }) +
      element('path', { class: 'reference', d: `M${plot.left} ${plot.bottom}L${plot.right} ${plot.top}` }),
  );
}

/** Each occupied cell is one mark: cells as wide as a mark hide nothing that could be seen; wider ones keep a long page small. */
function cells(
  { observed, simulated }: Cloud,
  xScale: Scale,
  yScale: Scale,
  cell: number,
): readonly (readonly [number, number])[] {
  const occupied = new Set<number>();
  for (let place = 0; place < observed.length; place++) {
    const column = Math.round(xScale(observed[place] as number) / cell);
    occupied.add(column * 1024 + Math.round(yScale(simulated[place] as number) / cell));
  }
  return [...occupied]
    .sort((one, other) => one - other)
    .map((key) => [Math.floor(key / 1024) * cell, (key % 1024) * cell]);
}
