import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { failureCodes } from '../../src/failure.ts';

const developers = readFileSync('DEVELOPERS.md', 'utf8');

describe('the house', () => {
  it('has only the agreed things at the top level', () => {
    const tracked = execFileSync('git', ['ls-files'], { encoding: 'utf8' }).split('\n').filter(Boolean);
    const top = [...new Set(tracked.map((path) => path.split('/')[0] ?? ''))].filter(
      (name) => !name.startsWith('.'),
    );
    expect(top.sort()).toEqual(
      [
        'DEVELOPERS.md',
        'LICENSE',
        'README.md',
        'example-project',
        'package-lock.json',
        'package.json',
        'schemas',
        'src',
        'tests',
        'tsconfig.json',
      ].sort(),
    );
  });

  it('documents every way in which a run can fail, and no other', () => {
    const documented = [...developers.matchAll(/^\| `([a-z-]+)` \| exit 2/gm)].map((match) => match[1]);
    expect(documented).toEqual([...failureCodes]);
  });

  it('names no registry in the lockfile', () => {
    expect(readFileSync('package-lock.json', 'utf8')).not.toMatch(/"resolved"/);
  });
});
