/** A command as a runner of GitHub Actions understands it. */
export interface Obeyed {
  readonly command: string;
  readonly properties: Readonly<Record<string, string>>;
  readonly data: string;
}

const decode = (text: string, more: readonly (readonly [string, string])[] = []) =>
  [['%0D', '\r'] as const, ['%0A', '\n'] as const, ...more, ['%25', '%'] as const].reduce(
    (old, [code, sign]) => old.replaceAll(code, sign),
    text,
  );

/**
 * What a runner would obey in a step's output: `::command a=b::data` at the start of a line after blanks, and the older
 * `##[command]data` anywhere in one, as other hosts read `##name[command]`; nothing between `::stop-commands::word` and `::word::`.
 * Written anew from the documentation of workflow commands, and from memory of the runner's own reading for blanks and the older form.
 */
export function obeyedIn(output: string): readonly Obeyed[] {
  const obeyed: Obeyed[] = [];
  let word: string | null = null;
  for (const line of output.split(/[\r\n\u0085\u2028\u2029]/)) {
    const read = readLine(line);
    if (read === null) continue;
    if (word !== null) {
      if (read.command === word) word = null;
    } else if (read.command === 'stop-commands') word = read.data;
    else obeyed.push(read);
  }
  return obeyed;
}

function readLine(line: string): Obeyed | null {
  const [, command, given = '', data = ''] = line.match(/^[\s\u0085]*::([^\s:]+)(?: (.*?))?::(.*)$/) ?? [];
  if (command !== undefined) {
    const properties = given
      .split(',')
      .filter((one) => one.includes('='))
      .map((one) => {
        const at = one.indexOf('=');
        const value = decode(one.slice(at + 1), [
          ['%3A', ':'],
          ['%2C', ','],
        ]);
        return [one.slice(0, at), value] as const;
      });
    return { command, properties: Object.fromEntries(properties), data: decode(data) };
  }
  const [, older, rest = ''] = line.match(/##\w*\[([^\s\]]+)[^\]]*\](.*)$/) ?? [];
  return older === undefined ? null : { command: older, properties: {}, data: rest };
}
