import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { boundAnswers } from './answers-bounds.ts';
import { fitAnswers } from './answers-fit.ts';
import { recordAnswers } from './answers-records.ts';

interface Case {
  readonly id: string;
  readonly source: string;
  readonly input: unknown;
  readonly expect: unknown;
}

const { cases } = JSON.parse(readFileSync('tests/published/hydrology-cases.json', 'utf8')) as {
  readonly cases: readonly Case[];
};

type Answer = (input: never) => unknown;
const answers = new Map<string, Answer>(Object.entries({ ...fitAnswers, ...recordAnswers, ...boundAnswers }));

/** Keys with a wider tolerance than relative 1e-9, each with the reason that its case gives. */
const wider: Readonly<Record<string, number>> = {
  'gof/shifted-1e8': 1e-6, // the offset leaves nine digits of the differences
  'trend.p': 1e-8,
  'pettitt.p': 1e-8,
  'forcing.p': 1e-8,
  'forcing.anova_p': 1e-8,
  'ks.p_limit': 1e-8,
  'ks.p_exact': 1e-8,
};

/** Keys that an answer rightly leaves out. */
const leftOut: Readonly<Record<string, string>> = {
  'ks/nile-two-windows.p_exact':
    'the record has ties, which break the exact count: the case says to compare D and p_limit',
};

describe('published and library values', () => {
  it('covers every family of cases', () => {
    const families = [...new Set(cases.map(({ id }) => id.split('/')[0]))];
    expect(families).toEqual(
      expect.arrayContaining([
        ...['gof', 'fdc', 'peaks', 'ratings', 'published', 'quantile', 'trend', 'pettitt', 'ks'],
        ...['window', 'warmup', 'forcing', 'seasonality'],
        ...['band', 'balance', 'budyko', 'domain', 'parameters', 'parsimony'],
      ]),
    );
    expect(cases.length).toBe(71);
  });

  for (const { id, source, input, expect: expected } of cases)
    it(`${id} (${source})`, () => {
      const answer = answerTo(id);
      expect(answer, `no public function answers ${id}`).toBeDefined();
      agree({ actual: answer?.(input as never), expected, id, key: '' });
    });
});

/** The answer under the longest name that the id begins with. */
function answerTo(id: string): Answer | undefined {
  const names = [...answers.keys()].filter((name) => id.startsWith(name));
  return answers.get(names.sort((a, b) => b.length - a.length)[0] ?? '');
}

function agree(of: { actual: unknown; expected: unknown; id: string; key: string }): void {
  const { actual, expected, id, key } = of;
  const where = `${id} ${key}`;
  if (typeof expected === 'object' && expected !== null) {
    if (Array.isArray(expected))
      expect((actual as ArrayLike<unknown> | null)?.length, where).toBe(expected.length);
    expect(actual, where).toBeTypeOf('object');
    for (const [name, each] of Object.entries(expected)) {
      if (leftOut[`${id}.${name}`]) continue;
      agree({ actual: (actual as Record<string, unknown>)[name], expected: each, id, key: name });
    }
  } else if (typeof expected === 'number' && !Number.isInteger(expected)) {
    expect(actual, where).toBeTypeOf('number');
    const family = id.split('/')[0];
    const relative = wider[id] ?? wider[`${family}.${key}`] ?? 1e-9;
    const slack = Math.max(1e-12, relative * Math.abs(expected));
    expect(
      Math.abs(Number(actual) - expected),
      `${where}: ${actual}, expected ${expected}`,
    ).toBeLessThanOrEqual(slack);
  } else if (typeof expected === 'number') {
    expect(Number(actual), `${where}: ${actual}`).toBeCloseTo(expected, 9);
    expect(actual, where).not.toBeNull();
  } else expect(actual, where).toBe(expected);
}
