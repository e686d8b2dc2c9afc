import type { StatedFile, Table } from '../manifest/data.generated.ts';
import type { FieldPath } from '../manifest/manifest.ts';
import { fileOfTable } from './each-table.ts';
import { isRecordName, runOfTarget } from './names.ts';
import type { Stated, Statement } from './statements.ts';

/** A path or pattern that the manifest writes, or a file that it says is kept elsewhere. */
export interface NamedFile {
  readonly pattern: string;
  readonly field: FieldPath;
  /**
   * `own`: the record is its home. `read`: the record depends on its content. `given`: the record reads what a run
   * gives, so where the run owns the file, the run's digest speaks for it. `seen`: the file is looked at anew in every
   * check (a reading, a list of entries), so no digest needs it. `elsewhere`: its own, but not in git.
   */
  readonly use: 'own' | 'read' | 'given' | 'seen' | 'elsewhere';
  /** For `given`: the record id of the run, where one is named. */
  readonly run?: string;
  /** For `elsewhere`: what is stated of it, where more than a path. */
  readonly stated?: Exclude<StatedFile, string>;
}

/** All that a record says of files. */
export function filesNamedBy(statement: Statement, stated: Stated): readonly NamedFile[] {
  const { data } = stated.manifest;
  const at = (...path: (string | number)[]): FieldPath => [...statement.field, ...path];
  switch (statement.area) {
    case 'study':
    case 'catchment':
    case 'periods':
    case 'setup':
      return listed(statement.fragment.files, at('files'), 'read');
    case 'model':
      return [
        ...listed(statement.fragment.executable, at('executable'), 'own'),
        ...listed(statement.fragment.environment?.files, at('environment', 'files'), 'read'),
      ];
    case 'inputs': {
      const { files, stored, preparation = [], missing_share: share } = statement.fragment;
      return [
        ...(typeof share === 'object' && 'table' in share
          ? tabled(share.table, at('missing_share', 'table'), 'read')
          : []),
        ...listed(files, at('files'), stored === 'elsewhere' ? stored : 'own'),
        ...preparation.flatMap(({ script }, index) =>
          listed(script, at('preparation', index, 'script'), 'read'),
        ),
      ];
    }
    case 'parameters': {
      const {
        table,
        sensitivity,
        calibrated_by,
        files,
        model_file,
        handbook_tables = {},
      } = statement.fragment;
      return [
        ...tabled(table, at('table')),
        ...Object.entries(handbook_tables).flatMap(([name, handbook]) =>
          tabled(handbook.table, at('handbook_tables', name, 'table')),
        ),
        ...listed(model_file?.file, at('model_file', 'file'), 'read'),
        ...listed(sensitivity?.file, at('sensitivity', 'file'), 'own'),
        ...listed(calibrated_by?.files, at('calibrated_by', 'files'), 'read'),
        ...listed(files, at('files'), 'read'),
      ];
    }
    case 'runs': {
      const { takes = [], gives, stored, stores, environment } = statement.fragment;
      return [
        ...listed(takes, at('takes'), 'read').filter(({ pattern }) => !isRecordName(pattern)),
        ...listed(gives, at('gives'), stored === 'elsewhere' ? stored : 'own'),
        ...given({ ...stores, run: statement.name ?? '' }, at('stores')),
        ...listed(environment?.files, at('environment', 'files'), 'read'),
      ];
    }
    case 'evaluation': {
      const { simulated, scores } = statement.fragment;
      // A table may hold the scores of many targets, so it is no target's own.
      return [...given(simulated, at('simulated')), ...tabled(scores?.table, at('scores', 'table'), 'read')];
    }
    case 'balance':
      return given(statement.fragment, at());
    case 'interventions': {
      const list = Array.isArray(statement.fragment) ? statement.fragment : [];
      return [
        ...list.flatMap(({ settings }, index) => listed(settings, at(index, 'settings'), 'own')),
        ...(data.seasons ?? []).flatMap(({ simulated }, index) =>
          given(simulated, ['seasons', index, 'simulated']),
        ),
      ];
    }
    case 'uncertainty': {
      const { sources = {}, bands = {}, files } = statement.fragment;
      return [
        ...Object.entries(sources).flatMap(([name, source]) =>
          listed(source.files, at('sources', name, 'files'), 'read'),
        ),
        ...Object.entries(bands).flatMap(([target, band]) =>
          given({ run: runOfTarget(target, stated), ...band }, at('bands', target)),
        ),
        ...listed(files, at('files'), 'read'),
      ];
    }
    case 'scenarios': {
      const conditions = Object.entries(data.scenarios?.conditions ?? {});
      const drivers = Object.entries(statement.fragment.drivers ?? {});
      return [
        ...conditions.flatMap(([name, condition]) => given(condition, ['scenarios', 'conditions', name])),
        ...drivers.flatMap(([name, driver]) => given(driver, at('drivers', name))),
      ];
    }
  }
}

function listed(
  value: string | readonly StatedFile[] | undefined,
  field: FieldPath,
  use: NamedFile['use'],
): readonly NamedFile[] {
  if (typeof value === 'string') return [{ pattern: value, field, use }];
  return (value ?? []).map((file, index) => {
    const place = [...field, index];
    return typeof file === 'string'
      ? { pattern: file, field: place, use }
      : { pattern: file.path, field: place, use: 'elsewhere', stated: file };
  });
}

function tabled(
  table: Table | undefined,
  field: FieldPath,
  use: 'own' | 'read' = 'own',
): readonly NamedFile[] {
  return table === undefined ? [] : [{ ...fileOfTable(table, field), use }];
}

function given(
  source: { readonly run?: string | undefined; readonly file?: string } | undefined,
  field: FieldPath,
): readonly NamedFile[] {
  if (source?.file === undefined) return [];
  const place = { pattern: source.file, field: [...field, 'file'], use: 'given' } as const;
  return [source.run === undefined ? place : { ...place, run: `runs.${source.run}` }];
}
