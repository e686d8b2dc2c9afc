import { readFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { globSync } from 'glob';
import { describe, expect, it } from 'vitest';

/** Each room with the rooms it may import from; DEVELOPERS.md draws the same flow. */
const upstream: Readonly<Record<string, readonly string[]>> = {
  repository: [],
  manifest: ['repository'],
  series: ['hydrology'],
  hydrology: [],
  records: ['manifest', 'repository'],
  facts: ['records', 'manifest', 'repository', 'series', 'hydrology'],
  rules: ['facts', 'records', 'manifest', 'repository', 'series', 'hydrology'],
  verdict: ['rules', 'facts', 'records', 'manifest'],
  reports: ['verdict', 'rules', 'records'],
  dossier: [
    'reports',
    'verdict',
    'rules',
    'facts',
    'records',
    'manifest',
    'repository',
    'series',
    'hydrology',
  ],
  commands: [
    'dossier',
    'reports',
    'verdict',
    'rules',
    'facts',
    'records',
    'manifest',
    'repository',
    'series',
    'hydrology',
  ],
  build: [],
};

/** Files at the top of src: what wires or serves all rooms. */
const topFiles = ['failure.ts', 'index.ts', 'main.ts', 'version.ts'];
const forAll = ['src/failure.ts', 'src/version.ts'];

const sources = globSync('src/**/*.{ts,mjs}', { ignore: ['**/*.test.ts'] }).sort();

const room = (path: string): string => {
  const [, first = '', ...rest] = path.split('/');
  return rest.length === 0 ? '' : first;
};

const importsOf = (path: string): readonly string[] =>
  [...readFileSync(path, 'utf8').matchAll(/(?:from|import)\s*\(?\s*'(\.[^']+)'/g)].map((match) =>
    relative('.', join(dirname(path), match[1] ?? '')),
  );

/** The imports of a file that run against the flow. */
function againstTheFlow(path: string, imports: readonly string[]): readonly string[] {
  const own = room(path);
  if (own === '') return [];
  return imports.filter((target) => {
    const other = room(target);
    if (other === own || forAll.includes(target)) return false;
    return !(upstream[own] ?? []).includes(other);
  });
}

describe('the walls between rooms', () => {
  it('sees every room', () => {
    expect([...new Set(sources.map(room))].filter((name) => name !== '').sort()).toEqual(
      Object.keys(upstream).sort(),
    );
  });

  it('lets no file import against the flow', () => {
    const offending = sources
      .filter((path) => room(path) !== 'build')
      .flatMap((path) => againstTheFlow(path, importsOf(path)).map((target) => `${path} imports ${target}`));
    expect(offending).toEqual([]);
  });

  it('would notice an import against the flow', () => {
    expect(
      againstTheFlow('src/records/a.ts', ['src/rules/b.ts', 'src/records/c.ts', 'src/failure.ts']),
    ).toEqual(['src/rules/b.ts']);
  });

  it('keeps process and the clock in main.ts', () => {
    const touching = sources.filter(
      (path) =>
        room(path) !== 'build' &&
        path !== 'src/main.ts' &&
        /\bprocess\.(?:env|argv|cwd|exit|exitCode|std\w+|on)\b|\bDate\.now\(|new Date\(\)/.test(
          readFileSync(path, 'utf8'),
        ),
    );
    expect(touching).toEqual([]);
  });

  it('keeps files short', () => {
    const long = sources.filter(
      (path) => !path.includes('.generated.') && readFileSync(path, 'utf8').split('\n').length > 400,
    );
    expect(long).toEqual([]);
  });

  it('has a caption for every room in DEVELOPERS.md', () => {
    const text = readFileSync('DEVELOPERS.md', 'utf8');
    const captions = Object.keys(upstream).filter(
      (name) => !new RegExp(`^\\| \`${name}\` \\|.{20,}`, 'm').test(text),
    );
    expect(captions).toEqual([]);
  });

  it('leaves only known files at the top of src', () => {
    expect(sources.filter((path) => room(path) === '').map((path) => path.slice(4))).toEqual(topFiles);
  });
});
