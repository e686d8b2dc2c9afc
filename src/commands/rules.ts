import { Failure } from '../failure.ts';
import { nearestName } from '../manifest/nearest.ts';
import { wrap } from '../reports/wrap.ts';
import { findRule, retired, rules } from '../rules/index.ts';
import { levelInWords } from '../rules/level-in-words.ts';
import type { Rule } from '../rules/rule.ts';
import { thresholdName } from '../rules/run.ts';
import type { Context, ExitStatus } from './command.ts';

const width = 100;

/** `stoplog rules`: every rule, or one in full. Throws Failure 'usage' for an id that no rule has. */
export async function rulesCommand(context: Context, id?: string): Promise<ExitStatus> {
  if (id === undefined) {
    context.write(listing());
    return 0;
  }
  const rule = findRule(id);
  if (rule === undefined) throw unknown(id);
  context.write(explanation(rule));
  return 0;
}

function listing(): string {
  const column = Math.max(...rules.map(({ id }) => id.length)) + 3;
  const lines = rules.flatMap((rule) =>
    wrap(`${rule.statement} (${levelInWords(rule)})`, width - column).map(
      (line, index) => (index === 0 ? rule.id : '').padEnd(column) + line,
    ),
  );
  return `${lines.join('\n')}\n\n\`stoplog rules ID\` says why one matters, where it comes from and how to clear it.\n`;
}

function explanation(rule: Rule): string {
  const { basis, citation } = rule.source;
  const parts: readonly (readonly [string, string])[] = [
    ['fires when', rule.statement],
    ['level', levelInWords(rule)],
    ['why', rule.why],
    ['source', basis === 'published' ? citation : `${bases[basis]}. ${citation}`],
    ['to clear', rule.clear],
    ...Object.entries(rule.limits ?? {}).map(([name, limit]) => {
      const unit = limit.unit === '1' ? '' : ` ${limit.unit}`;
      return ['limit', `${thresholdName(rule, name)}: ${limit.default}${unit}. ${limit.states}`] as const;
    }),
  ];
  const lines = parts.flatMap(([name, text]) =>
    wrap(text, width - 15).map((line, index) => `  ${(index === 0 ? name : '').padEnd(13)}${line}`),
  );
  return `${rule.id}\n\n${lines.join('\n')}\n`;
}

const bases = {
  definition: 'Follows from the words',
  practice: 'Practice without a published source',
  house: 'Stoplog’s own choice',
} as const;

function unknown(id: string): Failure {
  const gone = retired[id];
  if (gone !== undefined)
    return new Failure('usage', `${id} is no rule any more: ${gone}`, 'See: stoplog rules');
  const near = nearestName(
    id,
    rules.map((rule) => rule.id),
  );
  return new Failure(
    'usage',
    `\`${id}\` is no rule.`,
    near === undefined ? '`stoplog rules` lists them all.' : `The nearest is ${near}: stoplog rules ${near}`,
  );
}
