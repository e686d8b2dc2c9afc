import type { DriverFigures } from '../../facts/conditions.ts';
import type { Facts } from '../../facts/facts.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';
import { figure } from '../figures.ts';
import { type Draft, type Limits, rule } from '../rule.ts';
import { isAnnualRain } from './annual-rain.ts';
import { reachInWords } from './reach-in-words.ts';

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
  driver: DriverFigures,
  record: RecordNode<'scenarios'>,
  facts: Facts,
  { rain_decrease = 15, rain_increase = 20 }: Limits,
): readonly Draft[] {
  const { figures, reach, envelope } = driver;
  const calibrated = facts.scenarios.conditions.get(name)?.figures;
  if (!isDefined(figures) || !isDefined(reach) || calibrated === undefined || !isDefined(calibrated))
    return [];
  const { mean, outside, changePercent } = reach.value;
  const change = isDefined(changePercent) ? changePercent.value : 0;
  const isRainBeyond =
    (change < -rain_decrease || change > rain_increase) && isAnnualRain(name, record, facts);
  if (mean === null && !isRainBeyond && outside.length === 0) return [];

  const { unit, by = 'year' } = facts.manifest.data.scenarios?.conditions?.[name] ?? {};
  const words = reachInWords({
    calibrated: calibrated.value,
    scenario: figures.value,
    reach: reach.value,
    envelope,
    unit: unit ?? '1',
    by,
  });
  const what = `${name.replaceAll('_', ' ')} of scenario ${record.name}`;
  const about = {
    record: record.id,
    field: [...record.field, 'drivers', name],
    subject: name,
    found: Number(figures.value.mean.toPrecision(4)),
    ...(unit === undefined ? {} : { unit }),
    detail: words.detail,
  };
  if (mean !== null)
    return [
      {
        ...about,
        message: `The mean ${what}, ${words.scenarioMean}, lies outside the calibrated range of ${words.range}${words.change}.`,
      },
    ];
  if (isRainBeyond)
    return [
      {
        ...about,
        message: `The mean ${what}, ${words.scenarioMean}, is ${Math.abs(change).toFixed(1)} % ${change < 0 ? 'below' : 'above'} the calibrated ${words.calibratedMean}; a calibration is trusted from -${figure(rain_decrease)} to +${figure(rain_increase)} %.`,
      },
    ];
  return [
    {
      ...about,
      from: 'warn',
      message: `The ${what} lies outside the calibrated range of ${words.range} in ${outside.length} of ${figures.value.values.length} ${by}s, though its mean does not.`,
    },
  ];
}
