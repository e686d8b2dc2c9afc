import { figure } from '../../rules/figures.ts';
import { cross, dot, type LegendEntry, legendRow, lozenge, tickLabel } from './axes.ts';
import { type Chart, chart, chartWidth } from './chart.ts';
import { element, label, short } from './markup.ts';
import { extentOf, linear } from './scales.ts';

/** Values of a driver, one for each year, month or step. */
export interface DriverValues {
  readonly values: readonly number[];
  readonly mean: number;
}

const legend: readonly LegendEntry[] = [
  { mark: 'dots medium first', shape: 'dot', text: 'inside' },
  { mark: 'crosses second', shape: 'cross', text: 'outside' },
  { mark: 'lozenge', shape: 'lozenge', text: 'mean' },
  { mark: 'band', shape: 'area', text: 'calibrated range' },
];

/** A scenario's driver against the range that the model was calibrated on. Null without values. */
export function driverRanges(
  { calibrated, scenario }: { readonly calibrated: DriverValues; readonly scenario: DriverValues },
  of: { readonly title: string; readonly quantity: string; readonly source: string },
): Chart | null {
  const range = extentOf(calibrated.values);
  const extent = extentOf(calibrated.values, scenario.values);
  if (range === null || extent === null) return null;
  const scale = linear(extent, { from: 12, to: chartWidth - 12 });
  const isOutside = (value: number) => value < range.from || value > range.to;
  const outside = scenario.values.filter(isOutside);
  const row = ({ values, mean }: DriverValues, y: number) =>
    element('path', {
      class: 'dots medium first',
      d: spots(
        values.filter((value) => !isOutside(value)),
        scale,
      )
        .map((x) => dot(x, y))
        .join(''),
    }) +
    element('path', {
      class: 'crosses second',
      d: spots(values.filter(isOutside), scale)
        .map((x) => cross(x, y))
        .join(''),
    }) +
    element('path', { class: 'lozenge', d: lozenge(scale(mean), y - 14) });
  const box = `M${short(scale(range.from))} 30H${short(scale(range.to))}V136H${short(scale(range.from))}z`;
  const ticks = scale.ticks.map(
    (tick) => element('path', { class: 'grid', d: `M${short(tick.at)} 136v5` }) + tickLabel(tick, 153),
  );
  return chart(
    {
      title: of.title,
      summary: `Calibrated on ${figure(range.from)} to ${figure(range.to)} (mean ${figure(calibrated.mean)}); the scenario’s mean is ${figure(scenario.mean)}, and ${outside.length} of its ${scenario.values.length} values lie outside.`,
      source: of.source,
    },
    176,
    [
      element('path', { class: 'band', d: box }),
      legendRow(legend, 12),
      label(12, 46, 'calibration', { class: 'key' }),
      row(calibrated, 76),
      label(12, 98, 'scenario', { class: 'key' }),
      row(scenario, 126),
      ...ticks,
      element('path', { class: 'axis', d: `M12 136H${chartWidth - 12}` }),
      label(chartWidth - 12, 171, of.quantity, { class: 'axis-name', 'text-anchor': 'end' }),
    ].join(''),
  );
}

/** Where there are marks; those that fall on one spot are one. */
function spots(values: readonly number[], scale: (value: number) => number): readonly number[] {
  return [...new Set(values.map((value) => Math.round(scale(value))))].sort((one, other) => one - other);
}
