import { agreesAsPrinted, printedNumber } from '../../hydrology/stated/printed-number.ts';
import type { ParameterFile } from '../../manifest/data.generated.ts';
import type { Manifest } from '../../manifest/manifest.ts';
import type { Snapshot } from '../../repository/snapshot.ts';
import { numberOf, point } from '../../series/number-text.ts';
import { findOutput } from '../output.ts';
import { readTable, type TableRow } from '../table-rows.ts';
import type { StatedParameter } from './stated.ts';

/** A parameter of the record, looked up in the model's own file. */
export interface InModel {
  readonly of: StatedParameter;
  readonly file: string;
  /** Where the file has it; null where it has not. */
  readonly line: number | null;
  /** What the file has as its value. */
  readonly found: string | null;
  readonly agrees: boolean;
  /** Why it can't be told, as the end of a sentence that begins with the file. */
  readonly problem: string | null;
}

/** Every parameter of the record beside the model's own file; none where no such file is named, or it is not here. */
export async function parametersInModel(
  stated: readonly StatedParameter[],
  model: ParameterFile | undefined,
  manifest: Manifest,
  snapshot: Snapshot,
): Promise<readonly InModel[]> {
  if (model === undefined) return [];
  const place = await findOutput({ file: model.file }, { manifest }, snapshot);
  if ('undefined' in place) return [];
  const { path: file } = place.value;
  const rows = await readTable(file, model, snapshot);
  return stated.map((of) => {
    const outcome =
      typeof rows === 'string' ? { problem: `can’t be read: ${rows}` } : lookUp(of, rows, model);
    return { of, file, line: null, found: null, agrees: false, problem: null, ...outcome };
  });
}

type Outcome = Partial<Pick<InModel, 'line' | 'found' | 'agrees' | 'problem'>>;

function lookUp(of: StatedParameter, rows: readonly TableRow[], model: ParameterFile): Outcome {
  const { parameter, written } = of;
  const { name = 'name', value = 'value', scope, layer } = model;
  const keys: readonly (readonly [column: string | undefined, is: string | number | undefined])[] = [
    [name, parameter.name],
    [scope, parameter.scope],
    [layer, parameter.layer],
  ];
  for (const [column] of keys)
    if (column !== undefined && rows[0]?.cell(column) === undefined)
      return { problem: `has no column \`${column}\`` };
  const [row, ...more] = rows.filter((one) =>
    keys.every(([column, is]) => column === undefined || is === undefined || one.cell(column) === String(is)),
  );
  if (row === undefined) return { problem: `has no row for ${of.label}` };
  if (more.length > 0)
    return {
      line: row.line,
      problem: `has ${more.length + 1} rows for ${of.label}; name its columns of scopes and layers (\`scope\`, \`layer\`)`,
    };
  const found = row.cell(value);
  if (found === undefined) return { problem: `has no column \`${value}\`` };
  const number = numberOf(found, point);
  const printed = printedNumber(written ?? '');
  if (Number.isNaN(number))
    return { line: row.line, found, problem: `says "${found}" for ${of.label}, where a number is expected` };
  // A record may round what the model reads; the model can't round what the record has.
  return {
    line: row.line,
    found,
    agrees: printed === null || agreesAsPrinted({ stated: printed, recomputed: number }),
  };
}
