import { readFileSync } from 'node:fs';
import { parse } from 'yaml';
import type { Files } from '../harness/check-in-memory.ts';

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
  readonly leak?: number;
  readonly into?: string;
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
  const isMeant = (row: string) => {
    const [time = ''] = row.split(',');
    return time >= from && time <= to;
  };
  if (fault.do === 'swapped') {
    const place = rows.findIndex(isMeant);
    rows.splice(place, 2, ...rows.slice(place, place + 2).reverse());
    return `${[head, ...rows].join('\n')}\n`;
  }
  const column = fault.column === undefined ? 1 : head.split(',').indexOf(fault.column);
  if (fault.leak !== undefined)
    return leaking(text, column, head.split(',').indexOf(fault.into ?? ''), fault.leak);
  const planted = rows.flatMap((row, place): readonly string[] => {
    if (!isMeant(row)) return [row];
    if (fault.do === 'dropped') return [];
    if (fault.do === 'doubled') return [row, row];
    const from = fault.move === undefined ? row : (rows[place - fault.move] ?? row);
    const value = from.split(',')[column] ?? '';
    return [
      row
        .split(',')
        .with(column, fault.write ?? valueFor(fault, value))
        .join(','),
    ];
  });
  return `${[head, ...planted].join('\n')}\n`;
}

/** A flow from which so much is lost on every step, and a store in which what is lost adds up. */
function leaking(text: string, from: number, into: number, leak: number): string {
  let lost = 0;
  return text.replace(/^\d.*$/gm, (row) => {
    lost += leak;
    const cells = row.split(',');
    const less = (Number(cells[from]) - leak).toFixed(4);
    const more = (Number(cells[into]) + lost).toFixed(4);
    return cells.with(from, less).with(into, more).join(',');
  });
}

/** Codes for missing values stay what they are: blank, NA, and -9.9 in the example's rain. */
function valueFor({ times = 1, atMost = Number.POSITIVE_INFINITY }: PlantedFault, value: string): string {
  const number = Number(value || 'none');
  return Number.isNaN(number) || number === -9.9 ? value : String(Math.min(number * times, atMost));
}
