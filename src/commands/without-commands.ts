import { inert } from '../reports/escape.ts';
import type { Context } from './command.ts';

/**
 * Whatever a command prints, a CI host obeys none of it: a file's name or a manifest's text may hold anything. Annotations of our
 * own are let through; their text is escaped.
 */
export function withoutCommands(context: Context): Context {
  return {
    ...context,
    write: (text, may) => context.write(may === 'command' ? text : inert(text)),
    tell: (text) => context.tell(inert(text)),
  };
}
