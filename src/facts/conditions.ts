import { isDefined, type Statistic, undefinedBecause } from '../hydrology/paired.ts';
import { type PercentileEnvelope, percentileEnvelope } from '../hydrology/scenarios/percentile-envelope.ts';
import type { Condition, Driver } from '../manifest/data.generated.ts';
import type { RecordNode, Records } from '../records/record.ts';
import type { Snapshot } from '../repository/snapshot.ts';
import type { Series } from '../series/series.ts';
import { sameStep } from '../series/step.ts';
import { within } from '../series/within.ts';
import { areaKm2Of, yearBeginsOf } from './catchment.ts';
import {
  type ConditionFigures,
  conditionFigures,
  conditionVersion,
  type Making,
} from './conditions/figures.ts';
import { type CaseParameters, caseParameters } from './conditions/parameters.ts';
import { type JointReach, jointReach, jointVersion, type Reach, reachOf } from './conditions/reach.ts';
import { type ConditionSource, sourceOf } from './conditions/source.ts';
import { daysOfCondition, daysOfDriver } from './conditions/windows.ts';
import type { Away, Unusable } from './input.ts';
import { nodesIn } from './nodes-in.ts';
import type { Days } from './over.ts';
import { remembered } from './remembered.ts';

/** What a condition or a driver was. */
export interface Quantity {
  readonly figures: Statistic<ConditionFigures>;
  /** Where content is not here, so that nothing can be said: why. */
  readonly away: Away | null;
}

/** A driver of a scenario, held against the condition of its name. */
export interface DriverFigures extends Quantity {
  /** Undefined where either side is. */
  readonly reach: Statistic<Reach>;
  /** Of single steps; undefined where the two sides have not one step. */
  readonly envelope: Statistic<PercentileEnvelope>;
}

export interface CaseFigures {
  /** By the name of the condition. */
  readonly drivers: ReadonlyMap<string, DriverFigures>;
  /** Of the drivers that are known year by year. */
  readonly joint: Statistic<JointReach>;
  readonly parameters: CaseParameters;
}

/** The calibrated conditions, and how far each scenario reaches beyond them. */
export interface ScenarioFigures {
  /** By name. */
  readonly conditions: ReadonlyMap<string, Quantity>;
  /** By record id. */
  readonly cases: ReadonlyMap<string, CaseFigures>;
}

/** Computes conditions and drivers; those of unchanged files and windows are remembered. */
export async function scenariosOf(records: Records, snapshot: Snapshot): Promise<ScenarioFigures> {
  const stated = records.manifest.data.scenarios?.conditions ?? {};
  const conditions = new Map<string, Measured>();
  for (const [name, condition] of Object.entries(stated)) {
    const days = daysOfCondition(condition, records);
    conditions.set(name, await measure(condition, condition, days, records, snapshot));
  }
  const cases = new Map<string, CaseFigures>();
  for (const node of nodesIn(records.nodes, 'scenarios'))
    cases.set(node.id, await caseFigures(node, conditions, records, snapshot));
  return {
    conditions: new Map([...conditions].map(([name, { figures, away }]) => [name, { figures, away }])),
    cases,
  };
}

/** A quantity with the series that it was made of. */
interface Measured extends Quantity {
  readonly series: Source | Unusable;
}

interface Source {
  /** All that the figures depend on; JSON. */
  readonly from: unknown;
  /** The rows of the window. */
  read(): Promise<Statistic<Series>>;
}

async function measure(
  stated: Condition | Driver,
  condition: Condition,
  days: Statistic<Days>,
  records: Records,
  snapshot: Snapshot,
): Promise<Measured> {
  if (!isDefined(days)) return { figures: days, away: null, series: { ...days, away: null } };
  const { data } = records.manifest;
  const { by = 'year', total = false, unit } = condition;
  const making: Making = {
    ...days.value,
    by,
    total,
    yearBegins: yearBeginsOf(data),
    months: condition.months as Making['months'],
  };
  const source = await sourceOf(stated, records, snapshot);
  if ('undefined' in source) return { figures: source, away: source.away, series: source };
  const areaKm2 = areaKm2Of(data);
  const series = sourceWithin(source.value, unit, areaKm2, making);
  const basis = { what: 'condition', version: conditionVersion, from: series.from };
  const figures = await remembered(snapshot, basis, async () => {
    const read = await series.read();
    return isDefined(read) ? conditionFigures(read.value, making) : read;
  });
  return { figures, away: null, series };
}

function sourceWithin(
  source: ConditionSource,
  unit: string | undefined,
  areaKm2: number | null,
  making: Making,
): Source {
  return {
    from: { source: source.from, unit, areaKm2, making },
    async read() {
      const series = await source.read(unit, areaKm2 === null ? {} : { areaKm2 });
      return isDefined(series) ? { value: within(series.value, making) } : series;
    },
  };
}

async function caseFigures(
  node: RecordNode<'scenarios'>,
  conditions: ReadonlyMap<string, Measured>,
  records: Records,
  snapshot: Snapshot,
): Promise<CaseFigures> {
  const { fragment } = node;
  const stated = records.manifest.data.scenarios?.conditions ?? {};
  const drivers = new Map<string, DriverFigures>();
  const yearly = new Map<string, { calibrated: ConditionFigures; scenario: ConditionFigures }>();
  for (const [name, driver] of Object.entries(fragment.drivers ?? {})) {
    const condition = stated[name];
    const calibrated = conditions.get(name);
    if (condition === undefined || calibrated === undefined) continue;
    const days = daysOfDriver(driver, fragment.run, records);
    const measured = await measure(driver, condition, days, records, snapshot);
    const { figures, away } = measured;
    const envelope = await envelopeOf(calibrated, measured, snapshot);
    if (isDefined(figures) && isDefined(calibrated.figures)) {
      const sides = { calibrated: calibrated.figures.value, scenario: figures.value };
      const reach = { value: reachOf(sides.calibrated, sides.scenario) };
      drivers.set(name, { figures, away, reach, envelope });
      if ((condition.by ?? 'year') === 'year') yearly.set(name, sides);
    } else {
      const why = isDefined(figures) ? calibrated.figures : figures;
      const lacking = undefinedBecause('undefined' in why ? why.undefined : '');
      drivers.set(name, { figures, away, reach: lacking, envelope: lacking });
    }
  }
  const joint = { what: 'joint reach', version: jointVersion, from: [...yearly] };
  return {
    drivers,
    joint: await remembered(snapshot, joint, async () => jointReach(yearly)),
    parameters: await caseParameters(node, records, snapshot),
  };
}

/** Steps of the scenario outside all but the rarest of the calibration. */
async function envelopeOf(
  { series: calibrated }: Measured,
  { series: scenario }: Measured,
  snapshot: Snapshot,
): Promise<Statistic<PercentileEnvelope>> {
  if ('undefined' in calibrated) return calibrated;
  if ('undefined' in scenario) return scenario;
  const from = { calibrated: calibrated.from, scenario: scenario.from };
  return remembered(snapshot, { what: 'percentile envelope', version: conditionVersion, from }, async () => {
    const one = await calibrated.read();
    if (!isDefined(one)) return one;
    const other = await scenario.read();
    if (!isDefined(other)) return other;
    if (!sameStep(one.value.step, other.value.step))
      return undefinedBecause('the two have not one time step');
    const known = ({ values }: Series) => values.filter((value) => !Number.isNaN(value));
    return percentileEnvelope({ calibration: known(one.value), scenario: known(other.value) });
  });
}
