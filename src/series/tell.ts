import type { SeriesProblem } from './table.ts';

/** A problem as a sentence without its full stop: `data/flow.csv line 340, column flow_m3s: expected a number in m3/s, found "NA"; if it ...`. */
export function tellProblem(file: string, problem: SeriesProblem): string {
  const { line, column, expected, found, advice } = problem;
  const where = `${file}${line === null ? '' : ` line ${line}`}${column === null ? '' : `, column ${column}`}`;
  return `${where}: expected ${expected}, found ${found}${advice === '' ? '' : `; ${advice}`}`;
}
