import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { findRule, knownRules, retired, rules } from './index.ts';
import { levelInWords } from './level-in-words.ts';

const here = import.meta.dirname;
const readme = readFileSync('README.md', 'utf8');

interface RuleFile {
  /** `area/what-is-wrong`. */
  readonly path: string;
  readonly id: string;
  /** `areaWhatIsWrong`, the rule's export. */
  readonly name: string;
}

/** Files of the areas' folders that define a rule; others there hold what several rules share. */
const files: readonly RuleFile[] = readdirSync(here, { withFileTypes: true })
  .filter((entry) => entry.isDirectory())
  .flatMap(({ name: area }) =>
    readdirSync(join(here, area))
      .filter((file) => file.endsWith('.ts') && !file.endsWith('.test.ts'))
      .filter((file) => /= rule\(/.test(readFileSync(join(here, area, file), 'utf8')))
      .map((file) => {
        const what = file.slice(0, -'.ts'.length);
        const name = `${area}-${what}`.replace(/-(\w)/g, (_, letter: string) => letter.toUpperCase());
        return { path: `${area}/${what}`, id: `${area}.${what}`, name };
      }),
  );

describe('the list of rules', () => {
  it('has every rule of the folder, once, and no other', () => {
    expect(rules.map(({ id }) => id).sort()).toEqual(files.map(({ id }) => id).sort());
  });

  it('uses no retired id', () => {
    expect(rules.filter(({ id }) => id in retired)).toEqual([]);
  });

  it('keeps the rules of an area together, and areas in one order everywhere', () => {
    const areas = rules.map(({ id }) => id.slice(0, id.indexOf('.')));
    const changes = areas.filter((area, place) => area !== areas[place - 1]);
    expect(changes).toEqual([...new Set(areas)]);
  });

  it('tells rules and limits to those who name them', () => {
    const known = knownRules();
    expect(known.rules.get('seal.stale')).toBe('calibration');
    expect(known.limits.get('periods.warm_up_days')).toMatchObject({ default: 365, looser: 'lower' });
    expect(findRule('seal.stale')?.id).toBe('seal.stale');
    expect(findRule('seal.stael')).toBeUndefined();
  });

  it('gives one threshold one default, also where several rules use it', () => {
    const limits = rules.flatMap(({ id, limits: own = {} }) =>
      Object.entries(own).map(([name, { default: value, unit }]) => ({
        threshold: `${id.slice(0, id.indexOf('.'))}.${name}`,
        said: `${value} ${unit}`,
      })),
    );
    const defaults = new Map(limits.map(({ threshold, said }) => [threshold, said]));
    expect(limits.filter(({ threshold, said }) => defaults.get(threshold) !== said)).toEqual([]);
  });
});

describe.each(files)('$id', ({ path, id, name }) => {
  const rule = findRule(id);

  it('exports the rule under its own name', () => {
    expect(readFileSync(join(here, `${path}.ts`), 'utf8')).toContain(`export const ${name} = rule({`);
  });

  it('says when, why, whence and what to do', () => {
    const { statement, why, source, clear, limits = {} } = rule ?? {};
    const texts = [
      statement,
      why,
      source?.citation,
      clear,
      ...Object.values(limits).map(({ states }) => states),
    ];
    expect(texts.filter((text) => text === undefined || text.trim().length < 10)).toEqual([]);
    expect(Object.values(limits).filter(({ unit }) => unit === '')).toEqual([]);
  });

  it('cites a publication by its year, where it is published', () => {
    if (rule?.source.basis === 'published') expect(rule.source.citation).toMatch(/\b(?:19|20)\d\d\b/);
  });

  it('is tested on studies on which it fires and on which it is silent', () => {
    const test = join(here, `${path}.test.ts`);
    expect(existsSync(test)).toBe(true);
    // `ruleCases` refuses an empty list of either kind.
    expect(readFileSync(test, 'utf8')).toContain(`ruleCases(${name}, {`);
  });

  it('stands in the README', () => {
    const row = rule && `| \`${id}\` | ${rule.statement.replaceAll('|', '\\|')} | ${levelInWords(rule)} |`;
    expect(readme).toContain(row);
  });
});
