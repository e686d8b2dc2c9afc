import { Failure } from '../failure.ts';

/** Turns git's refusal into a Failure that says what to do; `errors` is its standard error. */
export function gitFailure(args: readonly string[], status: number, errors: string): Failure {
  const words = errors.trim();
  if (/^fatal: not a git repository/m.test(words)) {
    return new Failure(
      'no-repository',
      'This folder is in no git repository.',
      'Change to a folder of the repository, or begin one with `git init`.',
    );
  }
  const unreadable = /^error: open\("(.+)"\): (.+)$/m.exec(words);
  if (unreadable !== null) {
    const [, file, why] = unreadable;
    return new Failure(
      'unreadable-file',
      `${file} in the work tree could not be read: ${why}.`,
      'Give yourself the right to read it, or check what is staged or committed (--at index, --at HEAD).',
    );
  }
  const command = args.find((word) => !word.startsWith('-') && !word.includes('=')) ?? '';
  const said = words === '' ? 'and said nothing' : `and said:\n${words}`;
  return new Failure('git-failed', `git ${command} ended with status ${status} ${said}`, nextStep(words));
}

function nextStep(words: string): string {
  if (words.includes('detected dubious ownership')) {
    const folder = /repository at '(.*)'/.exec(words)?.[1] ?? '<folder>';
    return `The repository belongs to another user. If you trust it: git config --global --add safe.directory '${folder}'`;
  }
  const filter = /clean filter '(.*)' failed/.exec(words)?.[1];
  if (filter !== undefined) {
    return `.gitattributes sends this file through the filter '${filter}': install its program, or see \`git config filter.${filter}.clean\`.`;
  }
  const program = /^(\S+) .*: (?:command )?not found$/m.exec(words)?.[1];
  if (program !== undefined) {
    return `.gitattributes sends files through ${program}, which is not on PATH: install it, or check what is staged or committed (--at index, --at HEAD).`;
  }
  return 'Mend what git names; `git status` and `git fsck` may show more.';
}
