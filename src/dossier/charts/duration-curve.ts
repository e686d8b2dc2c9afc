import { figure } from '../../rules/figures.ts';
import { axes, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { type Drawing, inPlot, upwards } from './hydrograph.ts';
import { element, short } from './markup.ts';
import { extentOf, linear, logarithmic } from './scales.ts';
import type { Cloud } from './scatter.ts';

/**
 * Share of the time in which a value is exceeded, both sides ranked by themselves, plotting positions i / (n + 1) (Weibull). Logarithmic where all
 * that is drawn is above zero. Null without pairs.
 */
export function durationCurve({ observed, simulated }: Cloud, of: Drawing): Chart | null {
  const sorted = [observed, simulated].map((side) => Float64Array.from(side).sort().reverse());
  const [seen, made] = sorted;
  const extent = extentOf(...sorted);
  if (seen === undefined || made === undefined || extent === null) return null;
  const isLog = extent.from > 0;
  const yScale = isLog
    ? logarithmic(extent, upwards)
    : linear({ from: Math.min(0, extent.from), to: extent.to }, upwards);
  const xScale = linear({ from: 0, to: 100 }, inPlot);
  const path = (ranked: Float64Array) =>
    ranksDrawn(ranked.length, of.columns)
      .map((rank, place) => {
        const x = xScale((100 * (rank + 1)) / (ranked.length + 1));
        return `${place === 0 ? 'M' : 'L'}${short(x)} ${short(yScale(ranked[rank] as number))}`;
      })
      .join('');
  const exceeded = (ranked: Float64Array, percent: number) =>
    figure(ranked[Math.min(ranked.length - 1, Math.floor((percent / 100) * (ranked.length + 1)))] as number);
  return chart(
    {
      title: `${of.name}: duration curves`,
      summary: [5, 50, 95]
        .map(
          (percent) =>
            `Exceeded ${percent} % of the time: observed ${exceeded(seen, percent)}, simulated ${exceeded(made, percent)}.`,
        )
        .join(' '),
      source: of.source,
    },
    plotHeight,
    axes({
      xLabel: 'Share of time in which it is exceeded, %',
      yLabel: `${of.quantity}${isLog ? ' (logarithmic)' : ''}`,
      xTicks: xScale.ticks,
      yTicks: yScale.ticks,
      legend: [
        { mark: 'observed', shape: 'line', text: 'observed (thick)' },
        { mark: 'simulated dashed', shape: 'line', text: 'simulated (dashed)' },
      ],
    }) +
      element('path', { class: 'observed', d: path(seen) }) +
      element('path', { class: 'simulated dashed', d: path(made) }),
  );
}

/** All ranks of a short list; of a long one the ends, where the curve bends, one by one, and between them as many as can be told apart. */
function ranksDrawn(count: number, columns: number): readonly number[] {
  const ends = 25;
  const between = Math.min(200, columns);
  if (count <= 2 * ends + between) return Array.from({ length: count }, (_, rank) => rank);
  const stretch = (from: number, to: number, marks: number) =>
    Array.from({ length: marks }, (_, place) => from + Math.round(((to - from) * place) / (marks - 1)));
  return [
    ...stretch(0, ends - 1, ends),
    ...stretch(ends, count - ends - 1, between),
    ...stretch(count - ends, count - 1, ends),
  ];
}
