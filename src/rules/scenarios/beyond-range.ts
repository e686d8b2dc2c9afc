import type { Outside } from '../../facts/conditions/reach.ts';
import type { DriverFigures } from '../../facts/conditions.ts';
import type { Facts } from '../../facts/facts.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';
import { few, figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { isAnnualRain } from './annual-rain.ts';

export const scenariosBeyondRange = rule({
  id: 'scenarios.beyond-range',
  scope: 'scenarios',
  from: 'application',
  means: null,
  acceptable: true,
  statement:
    'The mean of a driver lies outside its calibrated range, or mean annual rain is further below or above that of calibration than the limits; single years outside warn.',
  why: 'Beyond the weather, cover and withdrawals that it was calibrated on, a model extrapolates, and its fit says nothing about how well. Somebody has to say why it may be trusted there, and answer for it.',
  source: {
    basis: 'published',
    citation:
      'Vaze, J. et al. (2010) J. Hydrol. 394:447-457: calibrated models serve for changes of mean annual rainfall within about 15 % (the two unequal ends from memory); the range itself follows from the words',
  },
  clear:
    'Test the model in conditions like these (a differential split-sample test on the driest, wettest or warmest years) and say in the case, under `accepts`, with `driver`, why it may be used there, with name and date; or leave the scenario out.',
  limits: {
    rain_decrease: {
      default: 15,
      unit: '%',
      states: 'how far mean annual rain may fall below that of calibration',
      looser: 'higher',
    },
    rain_increase: {
      default: 20,
      unit: '%',
      states: 'how far mean annual rain may rise above that of calibration',
      looser: 'higher',
    },
  },
  check: (record, facts, limits) =>
    [...(facts.scenarios.cases.get(record.id)?.drivers ?? [])].flatMap(([name, driver]) =>
      judge(name, driver, record, facts, limits),
    ),
});

function judge(
  name: string,
  { figures, reach, envelope }: DriverFigures,
  record: RecordNode<'scenarios'>,
  facts: Facts,
  limits: Limits,
): readonly Draft[] {
  const calibrated = facts.scenarios.conditions.get(name)?.figures;
  if (!isDefined(figures) || !isDefined(reach) || calibrated === undefined || !isDefined(calibrated))
    return [];
  const { mean, outside, changePercent } = reach.value;
  const change = isDefined(changePercent) ? changePercent.value : null;
  const { rain_decrease = 15, rain_increase = 20 } = limits;
  const isRainBeyond =
    change !== null &&
    (change < -rain_decrease || change > rain_increase) &&
    isAnnualRain(name, record, facts);
  if (mean === null && !isRainBeyond && outside.length === 0) return [];
  const { unit: stated, by = 'year' } = facts.manifest.data.scenarios?.conditions?.[name] ?? {};
  const unit = stated === undefined || stated === '1' ? '' : ` ${stated}`;
  const what = name.replaceAll('_', ' ');
  const { lowest, highest } = calibrated.value;
  const range = `${figure(lowest)} to ${figure(highest)}${unit}`;
  const worst = outside.reduce<Outside | null>(
    (so, one) => (so === null || sizeOf(one) > sizeOf(so) ? one : so),
    null,
  );
  const changed = change === null ? '' : ` (${signed(change)} %)`;
  const means = `The mean ${what} of scenario ${record.name}, ${figure(figures.value.mean)}${unit}, `;
  const isBeyond = mean !== null || isRainBeyond;
  const message =
    mean !== null
      ? `${means}lies outside the calibrated range of ${range}${changed}.`
      : isRainBeyond
        ? `${means}is ${Math.abs(change).toFixed(1)} % ${change < 0 ? 'below' : 'above'} the calibrated ${figure(calibrated.value.mean)}${unit}; a calibration is trusted from -${figure(rain_decrease)} to +${figure(rain_increase)} %.`
        : `${outside.length} of ${figures.value.values.length} ${by}s of ${what} in scenario ${record.name} lie outside the calibrated range of ${range}, though the mean does not.`;
  return [
    {
      record: record.id,
      field: [...record.field, 'drivers', name],
      subject: name,
      ...(isBeyond ? {} : { from: 'warn' as const }),
      found: Number(figure(figures.value.mean).replaceAll(' ', '')),
      ...(stated === undefined ? {} : { unit: stated }),
      message,
      detail: [
        ...(outside.length > 0 && worst !== null
          ? [
              `${outside.length} of ${figures.value.values.length} ${by}s outside ${range}: ${few(
                outside.map(({ label, value }) => `${label} (${figure(value)})`),
                6,
              )}`,
              `furthest: ${worst.label} with ${figure(worst.value)}${unit}${isDefined(worst.share) ? `, ${figure(100 * worst.share.value)} % of the range beyond its end` : ''}`,
            ]
          : []),
        `calibrated mean ${figure(calibrated.value.mean)}${unit} of ${calibrated.value.values.length} ${by}s (10th to 90th percentile ${figure(calibrated.value.p10)} to ${figure(calibrated.value.p90)}); in the scenario ${figure(figures.value.mean)}${unit} of ${figures.value.values.length}${changed}`,
        ...(isDefined(envelope)
          ? [
              `single steps: ${figure(100 * envelope.value.shareAboveHigh)} % above the calibrated 99th percentile and ${figure(100 * envelope.value.shareBelowLow)} % below the 1st (1 % each if nothing changed)`,
            ]
          : []),
      ],
    },
  ];
}

function sizeOf({ share }: Outside): number {
  return isDefined(share) ? share.value : Number.POSITIVE_INFINITY;
}

function signed(percent: number): string {
  return `${percent > 0 ? '+' : ''}${percent.toFixed(1)}`;
}
