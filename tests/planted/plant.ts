import { readFileSync } from 'node:fs';
import { parse } from 'yaml';

/** One line of faults.yaml. Its head says what each key means. */
export interface PlantedFault {
  readonly fault: string;
  readonly in: string;
  readonly change?: Readonly<Record<string, string>>;
  readonly rows?: string;
  readonly column?: string;
  readonly times?: number;
  readonly write?: string;
  readonly atMost?: number;
  readonly move?: number;
  readonly do?: 'removed' | 'dropped' | 'doubled' | 'swapped';
  readonly text?: string;
  readonly rule: string;
  readonly record: string;
  readonly says?: string;
  readonly level?: 'warn' | 'note';
  readonly changed?: string;
}

export function plantedFaults(): readonly PlantedFault[] {
  return parse(readFileSync(new URL('faults.yaml', import.meta.url), 'utf8')) as readonly PlantedFault[];
}

type Files = Readonly<Record<string, string>>;

/** The files with the fault in them. Throws where it would change nothing. */
export function plant(fault: PlantedFault, files: Files): Files {
  const { [fault.in]: old, ...others } = files;
  if (fault.do === 'removed' && fault.rows === undefined && old !== undefined) return others;
  if (fault.text !== undefined) return { ...others, [fault.in]: (old ?? '') + fault.text };
  if (old === undefined) throw new Error(`${fault.fault}: there is no ${fault.in}`);
  const planted = fault.change === undefined ? inRows(fault, old) : inText(fault.change, old);
  if (planted === old) throw new Error(`${fault.fault}: ${fault.in} stays as it is`);
  return { ...others, [fault.in]: planted };
}

function inText(change: Readonly<Record<string, string>>, text: string): string {
  return Object.entries(change).reduce((changed, [was, is]) => {
    const [before, after, ...more] = changed.split(was);
    if (before === undefined || after === undefined || more.length > 0)
      throw new Error(`"${was}" stands ${more.length + (after === undefined ? 0 : 1)} times, not once`);
    return before + is + after;
  }, text);
}

function inRows(fault: PlantedFault, text: string): string {
  const [head = '', ...rows] = text.trimEnd().split('\n');
  const [from = '', to = from] = (fault.rows ?? '/9999').split('/');
  const isMeant = (row: string | undefined) => {
    const time = row?.split(',')[0] ?? '';
    return time >= from && time <= to;
  };
  const column = fault.column === undefined ? 1 : head.split(',').indexOf(fault.column);
  const cell = (row: string | undefined) => row?.split(',')[column] ?? '';
  const write = (row: string, value: string) => row.split(',').with(column, value).join(',');
  const planted = rows.flatMap((row, place): readonly string[] => {
    if (fault.do === 'swapped')
      return [isMeant(row) ? rows[place + 1] : isMeant(rows[place - 1]) ? rows[place - 1] : row].flatMap(
        (one) => one ?? [],
      );
    if (!isMeant(row)) return [row];
    if (fault.do === 'dropped') return [];
    if (fault.do === 'doubled') return [row, row];
    if (fault.move !== undefined) return [write(row, cell(rows[place - fault.move] ?? row))];
    if (fault.write !== undefined) return [write(row, fault.write)];
    const number = Number(cell(row) || 'none');
    if (Number.isNaN(number) || number === -9.9) return [row];
    return [write(row, String(Math.min(number * (fault.times ?? 1), fault.atMost ?? Infinity)))];
  });
  return `${[head, ...planted].join('\n')}\n`;
}
