import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { withBlock } from '../../src/commands/hook/block.ts';
import { hookNames, scriptForGit, scriptForHusky } from '../../src/commands/hook/script.ts';
import { outside } from '../harness/outside.ts';

const hooks = hookNames.flatMap((hook) => {
  const before = { was: 'nothing', foldersMade: 0 } as const;
  const text = (rest: string, script: string) => withBlock(rest, script, before);
  return [
    [`${hook} for git`, text('#!/bin/sh\n', scriptForGit(hook, null, null))],
    [`${hook} after an earlier one`, text('#!/bin/sh\n', scriptForGit(hook, null, `${hook}.local`))],
    [`${hook} with a base`, text('#!/bin/sh\n', scriptForGit(hook, 'origin/main', null))],
    [`${hook} for husky`, text('#!/bin/sh\nnpm test\n', scriptForHusky(hook, null))],
  ] as const;
});

function said(program: string, args: readonly string[], input: string): string {
  const { status, stdout, stderr } = spawnSync(program, args, { input, encoding: 'utf8' });
  return `${status}${stdout}${stderr}`;
}

describe('the text of a hook', () => {
  it.each(hooks)('%s: is understood by sh', (_, text) => {
    expect(said('sh', ['-n'], text)).toBe('0');
    expect(said('sh', ['-n'], `${text}if`)).not.toBe('0');
  });

  const dash = outside('dash', ['-c', ':']);
  it.skipIf(!dash.available)(`is understood by dash ${dash.reason}`, () => {
    for (const [, text] of hooks) expect(said('dash', ['-n'], text)).toBe('0');
    expect(said('dash', ['-n'], `${hooks[0]?.[1]}if`)).not.toBe('0');
  });

  const shellcheck = outside('shellcheck');
  it.skipIf(!shellcheck.available)(`has nothing that shellcheck objects to ${shellcheck.reason}`, () => {
    const args = ['--shell=sh', '-'];
    for (const [, text] of hooks) expect(said('shellcheck', args, text)).toBe('0');
    expect(said('shellcheck', args, '#!/bin/sh\nif [[ $1 == x ]]; then echo $1; fi\n')).not.toBe('0');
  });

  it('stays short, and plain ASCII', () => {
    for (const [, text] of hooks) {
      expect(text.split('\n').length).toBeLessThan(60);
      expect(text).toMatch(/^[\x20-\x7e\n]*$/);
    }
  });
});
