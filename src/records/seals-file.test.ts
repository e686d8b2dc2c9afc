import { readFileSync } from 'node:fs';
import { Ajv2020 } from 'ajv/dist/2020.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { recordsOf, sealing } from '../../tests/records/in-memory.ts';
import { smallFiles, smallStudy } from '../../tests/records/small-study.ts';
import type { Seal } from './seal.ts';
import { withChecksum } from './seal-entry.ts';
import { readSealsFile, writeSealsFile } from './seals-file.ts';

const path = 'stoplog.seals.json';
const { seals } = sealing(await recordsOf(smallStudy, smallFiles));
const text = writeSealsFile(seals);
const lineOf = (line: string): number => text.split('\n').indexOf(line) + 1;

describe('the text of a seals file', () => {
  it('has the scheme first, sorted keys, two blanks for each level and one final newline', () => {
    expect(
      text.startsWith('{\n  "scheme": 1,\n  "records": {\n    "balance.catchment": {\n      "accepts": ['),
    ).toBe(true);
    expect(text.endsWith('\n  }\n}\n')).toBe(true);
    const records = Object.keys(JSON.parse(text).records);
    expect(records).toEqual([...records].sort());
    const [, first] = /"balance.catchment": (\{[\s\S]*?\n {4}\})/.exec(text) ?? [];
    const keys = Object.keys(JSON.parse(first ?? ''));
    expect(keys).toEqual([...keys].sort());
  });

  it('is the same whatever the order in memory', () => {
    expect(writeSealsFile(new Map([...seals].reverse()))).toBe(text);
  });

  it('is read back as it was written', () => {
    expect(readSealsFile(path, text)).toEqual({
      path,
      exists: true,
      seals,
      unreadable: new Map(),
      faults: [],
    });
    expect(writeSealsFile(readSealsFile(path, text).seals)).toBe(text);
    expect(readSealsFile(path, writeSealsFile(new Map())).faults).toEqual([]);
  });

  it('is what the schema says', () => {
    const schema = JSON.parse(readFileSync('schemas/seals.schema.json', 'utf8'));
    const validate = new Ajv2020({ strict: false, formats: { date: true } }).compile(schema);
    expect(validate(JSON.parse(text)) || validate.errors).toBe(true);
  });
});

describe('faults of a seals file', () => {
  it('are none where there is no file', () => {
    expect(readSealsFile(path, null)).toEqual({
      path,
      exists: false,
      seals: new Map(),
      unreadable: new Map(),
      faults: [],
    });
  });

  it.each<[string, string, number]>([
    ['{"scheme": 1,\n "records": {,}}', 'a comma too many', 2],
    ['{"scheme": 1,\n "records": {}\n', 'the end missing', 3],
    ['{"scheme": 1,\n "records": {}}\nmore', 'text behind the end', 3],
    ['{"scheme": 1,\n\n "records": x}', 'a word', 3],
    ['', 'nothing', 1],
  ])('name the line of broken JSON: %j (%s)', (broken, _, line) => {
    expect(readSealsFile(path, broken)).toMatchObject({
      exists: true,
      faults: [{ kind: 'not-json', record: null, line }],
    });
  });

  it.each(['[]', '{}', '{"scheme": 1, "records": []}', 'null'])('say that %s is no seals file', (other) => {
    expect(readSealsFile(path, other).faults).toMatchObject([{ kind: 'shape', record: null }]);
  });

  it('name an entry that was edited by hand, and leave the others alone', () => {
    const edited = text.replace('"sealed_on": "2026-03-02"', '"sealed_on": "2026-03-03"');
    const file = readSealsFile(path, edited);
    expect(file.faults).toMatchObject([{ kind: 'edited', record: 'balance.catchment', line: 4 }]);
    expect(file.seals.size).toBe(seals.size - 1);
    expect(writeSealsFile(file.seals, file.unreadable)).toBe(edited);
  });

  it('name the field of an entry that no seal has so', () => {
    const change = (entry: object): string => {
      const all = JSON.parse(text);
      all.records['inputs.flow'] = entry;
      return JSON.stringify(all, null, 2);
    };
    const faults = (entry: object) => readSealsFile(path, change(entry)).faults;
    const whole = { ...seals.get('inputs.flow') } as Record<string, unknown>;
    for (const [field, value] of [
      ['digest', 'abc'],
      ['grade', 'stated'],
      ['files', { 'a.csv': 'b' }],
      ['accepts', 'none'],
      ['sealed_on', 'yesterday'],
      ['more', 1],
    ] as const) {
      expect(faults({ ...whole, [field]: value })).toMatchObject([
        {
          kind: 'shape',
          record: 'inputs.flow',
          line: lineOf('    "inputs.flow": {'),
          message: expect.stringContaining(field),
        },
      ]);
    }
    expect(faults([])).toMatchObject([{ kind: 'shape', record: 'inputs.flow' }]);
  });

  it('say that a newer Stoplog sealed a record', () => {
    const { checksum: _, ...seal } = seals.get('inputs.flow') as Seal;
    const newer = writeSealsFile(new Map([...seals, ['inputs.flow', withChecksum({ ...seal, scheme: 2 })]]));
    expect(newer.startsWith('{\n  "scheme": 2,')).toBe(true);
    const file = readSealsFile(path, newer);
    expect(file.faults).toMatchObject([{ kind: 'newer-scheme', record: 'inputs.flow' }]);
    expect(file.seals.size).toBe(seals.size - 1);
    expect(readSealsFile(path, newer, 2).faults).toEqual([]);
  });

  it('leave what both sides of a conflict share', () => {
    const [first = '', ...rest] = text.split('    "catchment": {');
    const ours = `<<<<<<< HEAD\n${first.slice(first.indexOf('    "balance'))}=======\n    "balance.catchment": 1,\n>>>>>>> other\n`;
    const conflicted = `${first.slice(0, first.indexOf('    "balance'))}${ours}    "catchment": {${rest.join('    "catchment": {')}`;
    const file = readSealsFile(path, conflicted);
    expect(file.faults).toMatchObject([{ kind: 'conflict', record: null, line: 4 }]);
    expect([...file.seals.keys()].sort()).toEqual(
      [...seals.keys()].filter((id) => id !== 'balance.catchment').sort(),
    );
  });

  it('never throw, whatever a stranger writes', () => {
    const nested = '{"scheme":1,"records":{"a":'.concat('['.repeat(20_000), ']'.repeat(20_000), '}}');
    expect(readSealsFile(path, nested).faults).toMatchObject([{ kind: 'shape', record: 'a' }]);
    expect(readSealsFile(path, '{"records":{"__proto__":{"scheme":1}}}').faults).toMatchObject([
      { kind: 'shape', record: '__proto__' },
    ]);
    fc.assert(
      fc.property(
        fc.oneof(
          fc.string(),
          fc.json(),
          fc.json().map((json) => `{"scheme":1,"records":${json}}`),
        ),
        (any) => {
          expect(readSealsFile(path, any).seals.size).toBe(0);
        },
      ),
    );
  });

  it('show for every single change inside an entry', () => {
    const entry = seals.get('runs.calibrated') as Seal;
    const plain = JSON.stringify(entry);
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: plain.length - 1 }),
        fc.constantFrom('0', '1', 'f', 'x'),
        (at, sign) => {
          const changed = plain.slice(0, at) + sign + plain.slice(at + 1);
          fc.pre(changed !== plain);
          const file = readSealsFile(path, `{"scheme":1,"records":{"runs.calibrated":${changed}}}`);
          expect(file.seals.size).toBe(0);
          expect(file.faults).toHaveLength(1);
        },
      ),
    );
  });
});
