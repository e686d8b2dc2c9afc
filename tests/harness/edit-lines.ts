/** Edits of a file for tests, by line from 1. */
export type Edit = (text: string) => string;

/** Other text for single lines; null takes the line away. */
export function withLines(changes: Readonly<Record<number, string | null>>): Edit {
  return (text) =>
    text
      .split('\n')
      .flatMap((line, index) => changes[index + 1] ?? (changes[index + 1] === null ? [] : line))
      .join('\n');
}

/** Without the lines from one to another, both included. */
export function withoutLines(first: number, last: number): Edit {
  return (text) =>
    text
      .split('\n')
      .filter((_, index) => index + 1 < first || index + 1 > last)
      .join('\n');
}

/** Another value in the second column of the rows from one line to another, both included; all rows below the header unless said. */
export function withValues(
  change: (value: number, row: number) => number | string,
  first = 2,
  last = Number.POSITIVE_INFINITY,
): Edit {
  return (text) =>
    text
      .split('\n')
      .map((line, index) => {
        const [time, value] = line.split(',');
        if (value === undefined || index + 1 < first || index + 1 > last) return line;
        return `${time},${change(Number(value), index - 1)}`;
      })
      .join('\n');
}

/** One edit after another. */
export function inTurn(...edits: readonly Edit[]): Edit {
  return (text) => edits.reduce((edited, edit) => edit(edited), text);
}
