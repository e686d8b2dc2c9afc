import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

/** Reads every docstring of the room: each function prints an example, and the example must come out. */
const room = dirname(fileURLToPath(import.meta.url));
const files = readdirSync(room, { recursive: true, encoding: 'utf8' })
  .map((file) => file.replaceAll('\\', '/'))
  .filter((file) => file.endsWith('.ts') && !file.endsWith('.test.ts'))
  .sort();
const labels = ['Formula', 'Inputs', 'Range', 'Read', 'Undefined', 'Source', 'Example'];

interface Documented {
  readonly file: string;
  readonly name: string;
  readonly docstring: string;
}

const documented: Documented[] = files.flatMap((file) => {
  const text = readFileSync(join(room, file), 'utf8');
  return [...text.matchAll(/(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?^export (?:async )?function\*? (\w+)/gm)].map(
    (match) => ({ file, name: match[2] ?? '', docstring: match[1] ?? '' }),
  );
});

const scope: Record<string, unknown> = {};
for (const file of files) Object.assign(scope, await import(join(room, file)));

describe('docstrings of hydrology', () => {
  it('finds the functions', () => expect(documented.length).toBeGreaterThan(40));

  for (const { file, name, docstring } of documented) {
    it(`${file} ${name} says what a reader needs`, () => {
      const needed = file.includes('/') ? labels : ['Example'];
      for (const label of needed) expect(docstring, `no ${label}: line`).toContain(`${label}: `);
    });

    it(`${file} ${name} gives its printed example`, () => {
      const line = /Example: (.*?) -> (.*?)(?: \*\/)?$/m.exec(docstring);
      expect(line, 'no "Example: call -> result" line').not.toBeNull();
      const [, call = '', result = ''] = line ?? [];
      expect(call, 'the example does not call its function').toContain(name);
      holds(evaluate(call), evaluate(printed(result)), call);
    });
  }
});

/** A number in an expected result, standing for every number that prints so. */
class Printed {
  readonly value: number;
  readonly half: number;
  constructor(text: string) {
    this.value = Number(text);
    this.half = text.includes('.') ? 0.5 * 10 ** -(text.length - text.indexOf('.') - 1) : 0;
  }
}

function printed(result: string): string {
  return result.replace(/'[^']*'|-?\b\d+(?:\.\d+)?\b/g, (token) =>
    token.startsWith("'") ? token : `printed("${token}")`,
  );
}

function evaluate(expression: string): unknown {
  const names = Object.keys(scope);
  const body = new Function(...names, 'printed', `return (${expression});`);
  return body(...names.map((name) => scope[name]), (text: string) => new Printed(text));
}

/** Every key of the expected result is in the actual one, numbers within their printed decimals. */
function holds(actual: unknown, expected: unknown, where: string): void {
  if (expected instanceof Printed) {
    expect(actual, where).toBeTypeOf('number');
    expect(Math.abs(Number(actual) - expected.value), `${where} = ${actual}`).toBeLessThanOrEqual(
      expected.half + 1e-12,
    );
  } else if (Array.isArray(expected)) {
    expect(Array.from(actual as ArrayLike<unknown>).length, where).toBe(expected.length);
    expected.forEach((each, index) => {
      holds((actual as ArrayLike<unknown>)[index], each, `${where}[${index}]`);
    });
  } else if (typeof expected === 'object' && expected !== null) {
    for (const [key, each] of Object.entries(expected))
      holds((actual as Record<string, unknown>)[key], each, `${where}.${key}`);
  } else expect(actual, where).toBe(expected);
}
