import { randomUUID } from 'node:crypto';
import type { Context } from './command.ts';

/** What GitHub Actions obeys: `::` at the start of a line, after blanks; and `##[` anywhere in one. */
const obeyed = /(?:^|[\r\n\u0085\u2028\u2029])[\s\u0085]*::|##\[/;

/**
 * Under GitHub Actions, words that would be obeyed as a command are printed between marks that stop it from obeying: a file's
 * name or a manifest's text may hold anything. Annotations of our own are let through; their text is escaped.
 */
export function withoutCommands(context: Context): Context {
  if (context.environment.GITHUB_ACTIONS !== 'true') return context;
  return {
    ...context,
    write: (text, may) => context.write(may === 'command' ? text : disarmed(text)),
    tell: (text) => context.tell(disarmed(text)),
  };
}

function disarmed(text: string): string {
  if (!obeyed.test(text)) return text;
  // The word that ends it must be one that nobody could have foreseen.
  const word = randomUUID();
  return `::stop-commands::${word}\n${text}${text.endsWith('\n') ? '' : '\n'}::${word}::\n`;
}
