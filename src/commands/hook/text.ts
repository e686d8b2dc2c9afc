import { isAbsolute, relative } from 'node:path';
import { plain } from '../../reports/escape.ts';
import { wrap } from '../../reports/wrap.ts';
import type { HookHome } from './home.ts';
import type { HookState } from './look.ts';
import type { Done, HookReport } from './report.ts';
import { hookNames, notStarted } from './script.ts';
import type { Tool } from './tool.ts';

type Hook = HookState & { readonly done: Done };
type Show = (file: string) => string;

const width = 100;
const column = Math.max(...hookNames.map((name) => name.length)) + 5;

/** A report on hooks for a person; paths below `top` are given from there. */
export function describeHooks({ home, hooks, tool }: HookReport, top: string): string {
  const show: Show = (file) => {
    const way = relative(top, file);
    return plain(way.startsWith('..') || isAbsolute(way) ? file : way);
  };
  const lines: string[] = [];
  for (const one of new Set(hooks.map((hook) => hook.home))) {
    lines.push(heading(one, one === home, show), '');
    for (const hook of hooks) if (hook.home === one) lines.push(...describeHook(hook, show));
    lines.push('');
  }
  const ours = hooks.some((hook) => hook.home === home && hook.found === 'ours');
  const notes = [
    ...home.notes,
    ...(home.refusal === null ? [] : [home.refusal.message, home.refusal.next]),
    ...(ours ? toolNotes(tool, show) : []),
    ...(hooks.some(({ hook, done }) => done === 'written' && hook !== 'pre-receive') ? [limits] : []),
  ];
  return `${[...lines, ...notes.flatMap((note) => wrap(plain(note), width))].join('\n').trimEnd()}\n`;
}

const limits =
  'git runs none of these hooks for a rebase, a cherry-pick, a revert or with --no-verify: check pull requests too.';

function heading({ folder, starter, inForce }: HookHome, isNow: boolean, show: Show): string {
  const who = inForce ? `started by ${starter}` : isNow ? `for ${starter}` : 'where git does not look now';
  return `Hooks in ${show(folder)}, ${who}`;
}

function describeHook(hook: Hook, show: Show): readonly string[] {
  const [first, ...more] = [statement(hook), ...details(hook, show)].flatMap((text) =>
    wrap(text, width - column),
  );
  return [`  ${hook.hook.padEnd(column - 2)}${first}`, ...more.map((line) => ' '.repeat(column) + line)];
}

const foundWords: Readonly<Record<HookState['found'], string>> = {
  nothing: 'none',
  ours: 'checks the records',
  changed: 'Stoplog’s, but someone changed it since',
  another: 'not Stoplog’s',
};

const doneWords: Readonly<Record<Done, string>> = {
  none: '',
  written: 'written',
  renewed: 'brought up to date',
  left: 'left as it is: someone changed it since Stoplog wrote it',
  removed: 'taken away',
  restored: 'taken away; what was here before is back',
};

function statement({ done, found }: Hook): string {
  return done === 'none' ? foundWords[found] : doneWords[done];
}

function details(
  { done, found, executable, base, earlier, home, hook, file }: Hook,
  show: Show,
): readonly string[] {
  const details: string[] = [];
  if (base !== null && found === 'ours') details.push(`holds back only what is new since ${base}`);
  if (earlier !== null && !earlier.exists) {
    details.push(`the hook that was here before, ${show(earlier.file)}, is gone`);
  } else if (earlier !== null) {
    details.push(
      earlier.executable
        ? `first runs ${show(earlier.file)}, the hook that was here before`
        : `keeps ${show(earlier.file)}, the hook that was here before; it is not executable, so it is skipped, as git skipped it`,
    );
  }
  if (found !== 'nothing' && home.starter === 'git' && !executable) {
    details.push(
      `not executable, so git skips it${found === 'ours' ? '; `stoplog hook add` mends that' : ''}`,
    );
  }
  if (done === 'left') {
    const back = earlier?.exists ? ` and rename ${show(earlier.file)} to ${hook}` : '';
    details.push(`to be rid of it, keep what you need of ${show(file)}, delete it${back}`);
  }
  return details;
}

function toolNotes({ node, stoplog, leftAside }: Tool, show: Show): readonly string[] {
  const aside = leftAside ? [notStarted] : [];
  const missing: string[] = [];
  if (node === null)
    missing.push('Node.js is not on PATH: until it is, these hooks hold back every commit and push.');
  if (stoplog === null) {
    missing.push(
      'Stoplog is neither in node_modules nor on PATH: until it is, these hooks hold back every commit and push. ' +
        'Install it with `npm install --global stoplog`, or with `npm install --save-dev stoplog` where the project has a package.json.',
    );
  }
  return [...aside, ...(missing.length > 0 ? missing : [`They start ${show(stoplog ?? '')}.`])];
}
