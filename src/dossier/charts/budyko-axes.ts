import { budykoCurve } from '../../hydrology/balance/budyko-curve.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../../rules/figures.ts';
import { axes, plotHeight } from './axes.ts';
import { type Chart, chart } from './chart.ts';
import { inPlot, upwards } from './hydrograph.ts';
import { element, short } from './markup.ts';
import { linear } from './scales.ts';

/** Where a volume with rain lies between the limits of water and of energy, beside Budyko's curve (Budyko 1974, Climate and Life). */
export function budykoAxes(
  point: { readonly aridity: number; readonly evaporativeRatio: number },
  of: { readonly name: string; readonly source: string },
): Chart {
  const { aridity, evaporativeRatio } = point;
  const widest = Math.max(2, aridity * 1.25);
  const xScale = linear({ from: 0, to: widest }, inPlot);
  const yScale = linear(
    { from: Math.min(0, evaporativeRatio), to: Math.max(1.2, evaporativeRatio) },
    upwards,
  );
  const at = (x: number, y: number) => `${short(xScale(x))} ${short(yScale(y))}`;
  const curve = Array.from({ length: 60 }, (_, place) => ((place + 1) * widest) / 60).flatMap((x) => {
    const y = budykoCurve(x);
    return isDefined(y) ? [at(x, y.value)] : [];
  });
  const here = budykoCurve(aridity);
  return chart(
    {
      title: `${of.name}: between the limits of water and energy`,
      summary: `Aridity (potential evapotranspiration over precipitation) ${figure(aridity)}; evapotranspiration is ${figure(evaporativeRatio)} of precipitation${isDefined(here) ? `, where Budyko’s curve has ${figure(here.value)}` : ''}.`,
      source: of.source,
    },
    plotHeight,
    axes({
      xLabel: 'Potential evapotranspiration / precipitation',
      yLabel: 'Evapotranspiration / precipitation',
      xTicks: xScale.ticks,
      yTicks: yScale.ticks,
      legend: [
        { mark: 'lozenge', shape: 'lozenge', text: 'this volume' },
        { mark: 'reference', shape: 'line', text: 'limits (dashed)' },
        { mark: 'observed', shape: 'line', text: 'Budyko’s curve' },
      ],
    }) +
      element('path', { class: 'reference', d: `M${at(0, 0)}L${at(1, 1)}L${at(widest, 1)}` }) +
      element('path', { class: 'observed', d: `M${at(0, 0)}L${curve.join('L')}` }) +
      element('path', { class: 'lozenge', d: `M${at(aridity, evaporativeRatio)}m0-7l7 7l-7 7l-7-7z` }),
  );
}
