import type { Condition, Driver, Window } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';
import { settingsAddress } from './field.ts';
import { isRecordName, type Reference, resolveName, runOfTarget } from './names.ts';
import type { Area } from './record.ts';
import type { Stated, Statement, StatementIn } from './statements.ts';

/**
 * What a record's truth depends on, as the first scheme has it. Names may stand for nothing; records that the
 * manifest does not have, and fields that are not stated, are left out where the record does not name them itself.
 */
export function restsOnFirst(statement: Statement, stated: Stated): readonly Reference[] {
  const found: Reference[] = [];
  const { data } = stated.manifest;
  const at = (...path: (string | number)[]): FieldPath => [...statement.field, ...path];

  /** A record that is named, as `rainfall` or as `inputs.rainfall`. */
  const named = (area: string, name: string | undefined, field: FieldPath): void => {
    if (name === undefined) return;
    found.push({ to: name.startsWith(`${area}.`) ? name : `${area}.${name}`, written: name, field });
  };
  /** Records and fields that it depends on without naming them. */
  const silently = (...addresses: string[]): void => {
    for (const to of addresses) {
      if (resolveName(to, stated) !== null) found.push({ to, written: to, field: statement.field });
    }
  };
  const listed = (names: readonly string[] | undefined, field: FieldPath): void => {
    for (const [index, name] of (names ?? []).entries())
      found.push({ to: name, written: name, field: [...field, index] });
  };
  const over = (window: Window | undefined): void => {
    if (window !== undefined && /^[a-z]+$/.test(window)) silently(`periods.${window}`);
  };
  const series = (source: Condition | Driver, field: FieldPath): void => {
    named('inputs', source.input, [...field, 'input']);
    named('runs', source.run, [...field, 'run']);
  };

  switch (statement.area) {
    case 'parameters':
      silently('model', 'setup', 'periods.calibration');
      silently(...inArea(stated, 'evaluation').map(({ id }) => `${id}.periods.calibration`));
      if (statement.fragment.calibrated_by?.on !== undefined) {
        for (const [index, name] of statement.fragment.calibrated_by.on.entries()) {
          named('inputs', name, at('calibrated_by', 'on', index));
        }
      } else silently(...inputsOfEvaluation(stated));
      break;
    case 'runs':
      silently('model', 'setup', 'parameters', settingsAddress);
      if (statement.fragment.simulation === undefined) silently('periods.simulation');
      if (statement.fragment.warm_up === undefined) silently('periods.warm_up');
      for (const [index, taken] of (statement.fragment.takes ?? []).entries()) {
        if (isRecordName(taken)) found.push({ to: taken, written: taken, field: at('takes', index) });
      }
      break;
    case 'evaluation': {
      const { observed, simulated, periods: own } = statement.fragment;
      named('runs', simulated?.run, at('simulated', 'run'));
      named('inputs', observed?.input, at('observed', 'input'));
      if (own?.calibration === undefined) silently('periods.calibration');
      if (own?.validation === undefined) silently('periods.validation');
      break;
    }
    case 'balance':
      named('runs', statement.fragment.run, at('run'));
      over(statement.fragment.over);
      break;
    case 'interventions':
      for (const [index, { simulated, observed }] of (data.seasons ?? []).entries()) {
        named('runs', simulated?.run, ['seasons', index, 'simulated', 'run']);
        named('inputs', observed?.input, ['seasons', index, 'observed', 'input']);
      }
      break;
    case 'uncertainty':
      for (const [target, band] of Object.entries(statement.fragment.bands ?? {})) {
        named('evaluation', target, at('bands', target));
        if (band.run !== undefined) named('runs', band.run, at('bands', target, 'run'));
        else silently(`runs.${runOfTarget(target, stated)}`);
        over(band.over);
      }
      break;
    case 'scenarios':
      named('runs', statement.fragment.run, at('run'));
      for (const [name, driver] of Object.entries(statement.fragment.drivers ?? {})) {
        series(driver, at('drivers', name));
        over(driver.over);
      }
      for (const [name, condition] of Object.entries(data.scenarios?.conditions ?? {})) {
        series(condition, ['scenarios', 'conditions', name]);
        over(condition.over ?? 'calibration');
        if (condition.by === 'year') silently('periods.year_begins');
      }
      silently(...inArea(stated, 'evaluation').map(({ id }) => id));
  }
  if (Array.isArray(statement.fragment)) {
    for (const [index, { rests_on }] of statement.fragment.entries()) listed(rests_on, at(index, 'rests_on'));
  } else listed(statement.fragment.rests_on, at('rests_on'));
  return found;
}

/** What the evaluated runs take, and what they are held against: the data of a calibration that does not say. */
function inputsOfEvaluation(stated: Stated): readonly string[] {
  return inArea(stated, 'evaluation').flatMap(({ fragment: { simulated, observed } }) => {
    const run = stated.statements.get(`runs.${simulated?.run}`) as StatementIn<'runs'> | undefined;
    const taken = (run?.fragment.takes ?? []).filter(
      (name) => name.startsWith('inputs.') && isRecordName(name),
    );
    return [...taken, `inputs.${observed?.input}`];
  });
}

function inArea<A extends Area>({ statements }: Stated, area: A): readonly StatementIn<A>[] {
  return [...statements.values()].filter((one) => one.area === area) as unknown as readonly StatementIn<A>[];
}
