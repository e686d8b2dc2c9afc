import { spawnSync } from 'node:child_process';
import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { outside } from '../../harness/outside.ts';
import { type Json, theAwkward, theExample } from './projects.ts';

const prov = outside('/usr/bin/python3', ['-c', 'import prov']);
const rapper = outside('rapper', ['--version']);

const texts: Record<string, string> = {};
beforeAll(async () => {
  texts.example = (await theExample()).text('prov.json');
  texts.awkward = (await theAwkward()).text('prov.json');
}, 120_000);
const read = (name: string): Json => JSON.parse(texts[name] ?? '');

/**
 * Reads a document with python3-prov, compares it with itself after a second reading, and prints how many records and times it
 * kept, then PROV-O in Turtle. It drops a time that it can't read without a word, so times are counted.
 */
const script = `
import json, sys
from prov.model import ProvDocument
document = ProvDocument.deserialize(content=sys.stdin.read(), format='json')
assert document == ProvDocument.deserialize(content=document.serialize(format='json'), format='json')
activities = [one for one in document.get_records() if hasattr(one, 'get_startTime')]
times = sum(1 for one in activities for time in (one.get_startTime(), one.get_endTime()) if time)
print(json.dumps({'records': len(document.get_records()), 'times': times, 'turtle': document.serialize(format='rdf', rdf_format='turtle'), 'notation': document.get_provn()}))
`;

function readByProv(text: string): { said: Json; refusal: string } {
  const { stdout, stderr, status } = spawnSync('/usr/bin/python3', ['-c', script], {
    input: text,
    encoding: 'utf8',
    maxBuffer: 2 ** 28,
  });
  return { said: status === 0 ? JSON.parse(stdout) : null, refusal: status === 0 ? '' : stderr };
}

const things = ['entity', 'activity', 'agent'];
const relationsOf = (document: Json): [string, Json][] =>
  Object.entries(document).filter(([key]) => key !== 'prefix' && !things.includes(key));

/** Ends of relations that lead to nothing. */
function dangling(document: Json): string[] {
  const known = new Set(things.flatMap((kind) => Object.keys(document[kind])));
  const ends = /^prov:(activity|entity|agent|plan|generatedEntity|usedEntity|collection)$/;
  return relationsOf(document).flatMap(([, all]) =>
    Object.values(all).flatMap((one: Json) =>
      Object.entries<string>(one).flatMap(([key, value]) =>
        ends.test(key) && !known.has(value) ? [value] : [],
      ),
    ),
  );
}

/** Generations before the start or after the end of their activity, and things generated twice. Source: PROV-CONSTRAINTS. */
function disorder(document: Json): string[] {
  const generated = Object.values<Json>(document.wasGeneratedBy ?? {});
  const wrong = generated.flatMap((one) => {
    const { 'prov:startTime': start, 'prov:endTime': end } = document.activity[one['prov:activity']];
    const time = one['prov:time'];
    if (time === undefined) return [];
    return Date.parse(start) <= Date.parse(time) && Date.parse(time) <= Date.parse(end)
      ? []
      : [one['prov:entity']];
  });
  const all = generated.map((one) => one['prov:entity']);
  return [...wrong, ...all.filter((id, place) => all.indexOf(id) !== place)];
}

const timesIn = (document: Json): number =>
  Object.values<Json>(document.activity).flatMap((one) => Object.keys(one).filter((key) => /Time$/.test(key)))
    .length;

describe.each(['example', 'awkward'])('the provenance of the %s project', (name) => {
  it.skipIf(!prov.available)('is read by python3-prov whole, with all its times', () => {
    const { said, refusal } = readByProv(texts[name] ?? '');
    expect(refusal).toBe('');
    const document = read(name);
    const statements = [...things, ...relationsOf(document).map(([key]) => key)].flatMap((key) =>
      Object.keys(document[key]),
    );
    expect(said.records).toBe(statements.length);
    expect(said.times).toBe(timesIn(document));
    expect(said.times).toBeGreaterThan(20);
    expect(said.notation).toMatch(/^document/);
  });

  it.skipIf(!prov.available || !rapper.available)(
    'is Turtle too, by python3-prov, which rapper can read',
    () => {
      const { said } = readByProv(texts[name] ?? '');
      const parse = (input: string) =>
        spawnSync('rapper', ['-q', '-i', 'turtle', '-c', '-', 'http://a.example/'], {
          input,
          encoding: 'utf8',
        });
      expect([parse(said.turtle).status, parse(said.turtle).stderr]).toEqual([0, '']);
      expect(parse(`${said.turtle} nonsense`).status).not.toBe(0);
    },
  );

  it('leads nowhere that is not there', () => {
    expect(dangling(read(name))).toEqual([]);
    const broken = read(name);
    delete broken.entity[Object.keys(broken.entity)[0] ?? ''];
    expect(dangling(broken)).not.toEqual([]);
  });

  it('generates each thing once, within its activity', () => {
    expect(disorder(read(name))).toEqual([]);
    const activities = Object.values<Json>(read(name).wasGeneratedBy).filter((one) => one['prov:time']);
    fc.assert(
      fc.property(
        fc.nat(activities.length - 1),
        fc.integer({ min: 1, max: 1e6 }),
        fc.boolean(),
        (place, by, early) => {
          const broken = read(name);
          const moved = Object.values<Json>(broken.wasGeneratedBy).filter((one) => one['prov:time'])[place];
          const { 'prov:startTime': start, 'prov:endTime': end } = broken.activity[moved['prov:activity']];
          const time = early ? Date.parse(start) - by * 1000 : Date.parse(end) + by * 1000;
          moved['prov:time'] = new Date(time).toISOString();
          expect(disorder(broken)).toEqual([moved['prov:entity']]);
        },
      ),
      { numRuns: 20 },
    );
  });

  it('names nothing by its path', () => {
    const document = read(name);
    const ids = things.flatMap((kind) => Object.keys(document[kind]));
    for (const id of ids)
      expect(id).toMatch(/^id:[0-9a-f]{8}-[0-9a-f]{4}-8[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  });
});

describe('python3-prov', () => {
  it.skipIf(!prov.available)('refuses a broken document, and drops a bad time so that we see it', () => {
    const unknownPrefix = read('example');
    unknownPrefix.entity['nowhere:x'] = {};
    expect(readByProv(JSON.stringify(unknownPrefix)).refusal).toContain('ProvElementIdentifierRequired');
    const unknownRelation = { ...read('example'), usedd: { '_:x': {} } };
    expect(readByProv(JSON.stringify(unknownRelation)).refusal).toContain('usedd');
    const badTime = read('example');
    const activity: Json = Object.values<Json>(badTime.activity).find((one: Json) => one['prov:endTime']);
    activity['prov:endTime'] = 'the second of March';
    expect(readByProv(JSON.stringify(badTime)).said.times).toBe(timesIn(badTime) - 1);
  });
});

describe('what provenance says', () => {
  it('of a run: its outputs come from all that it takes', () => {
    const document = read('example');
    const idOf = (label: string) =>
      Object.entries<Json>({ ...document.entity, ...document.activity }).find(
        ([, one]) => one['prov:label'] === label,
      )?.[0];
    const output = idOf('runs/calibrated/daily.csv');
    const run = idOf('runs.calibrated');
    const generation = Object.values<Json>(document.wasGeneratedBy).find(
      (one) => one['prov:entity'] === output,
    );
    expect(generation).toEqual({
      'prov:entity': output,
      'prov:activity': run,
      'prov:time': '2025-03-02T23:59:59Z',
    });
    const source = Object.values<Json>(document.wasDerivedFrom).find(
      (one) => one['prov:generatedEntity'] === output,
    )['prov:usedEntity'];
    const members = Object.values<Json>(document.hadMember).filter(
      (one) => one['prov:collection'] === source,
    );
    expect(members.map((one) => one['prov:entity'])).toContain(idOf('data/rain/high-tarrow.csv'));
    const used = Object.values<Json>(document.used).filter((one) => one['prov:activity'] === run);
    expect(used).toHaveLength(members.length);
    expect(document.activity[run ?? '']).toMatchObject({
      'prov:startTime': '2025-03-02T00:00:00Z',
      'stoplog:day': { $: '2025-03-02', type: 'xsd:date' },
    });
  });

  it('of a seal: who, when, and over which content', () => {
    const document = read('example');
    const [activity] =
      Object.entries<Json>(document.activity).find(
        ([, one]) => one['prov:label'] === 'Sealing of inputs.rainfall',
      ) ?? [];
    const { 'prov:agent': agent } = Object.values<Json>(document.wasAssociatedWith).find(
      (one) => one['prov:activity'] === activity,
    );
    expect(document.agent[agent]).toMatchObject({ 'foaf:name': 'Northmere Catchment Office' });
    const used = Object.values<Json>(document.used).filter((one) => one['prov:activity'] === activity);
    const paths = used.map((one) => document.entity[one['prov:entity']]['stoplog:path']);
    expect(paths).toContain('data/rain/high-tarrow.csv');
  });
});
