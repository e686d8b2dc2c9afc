import { spawnSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { commandLine } from '../../../src/dossier/machine/command-line.ts';
import { outside, outsidePackage } from '../../harness/outside.ts';
import { awkwardNames, type Json, type Project, theAwkward, theExample, writeCrate } from './projects.ts';

const require = createRequire(import.meta.url);
const roCrate = outsidePackage('ro-crate');
const jsonld = outsidePackage('jsonld');
const rdflib = outside('/usr/bin/python3', ['-c', 'import rdflib']);
const address = 'https://w3id.org/ro/crate/1.2/context';

const projects: Record<string, Project> = {};
beforeAll(async () => {
  projects.example = await theExample();
  projects.awkward = await theAwkward();
}, 120_000);

const folders: string[] = [];
afterEach(() => {
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true });
});

const project = (name: string): Project => {
  const found = projects[name];
  if (found === undefined) throw new Error(name);
  return found;
};
const graphOf = (name: string): Json[] => project(name).json('ro-crate-metadata.json')['@graph'];
const entity = (graph: Json[], id: string): Json => graph.find((one) => one['@id'] === id);
const listed = (value: Json): Json[] => (value === undefined ? [] : [value].flat());

/** The crate's text after a change of its graph. */
function changed(name: string, change: (graph: Json[]) => void): string {
  const crate = project(name).json('ro-crate-metadata.json');
  change(crate['@graph']);
  return JSON.stringify(crate);
}

/**
 * What ro-crate 3.7.2 says against a crate that lies in a folder. Its `validate()` is not called: that asks the network for the
 * context. It compares identifiers with names as they stand, so it gets those of the crate, decoded once for what is on disk.
 */
function faultsOf(name: string, text?: string, without?: string): string[] {
  const folder = mkdtempSync(join(tmpdir(), 'stoplog-crate-'));
  folders.push(folder);
  writeCrate(folder, project(name), text);
  if (without !== undefined) rmSync(join(folder, without));
  const { Validator } = require(join(roCrate.folder, 'lib/validator.js'));
  const validator = new Validator();
  validator.parseJSON(readFileSync(join(folder, 'ro-crate-metadata.json'), 'utf8'));
  if (validator.crate !== null) {
    validator.rootDataEntity();
    const onDisk = new Set(
      readdirSync(folder, { recursive: true, withFileTypes: true })
        .filter((one) => one.isFile())
        .map((one) => relative(folder, join(one.parentPath, one.name))),
    );
    const ids: string[] = [...validator.crate.entities()].map((one: Json) => one['@id']);
    const present = ids.filter((id) => !id.includes('://') && onDisk.has(decodeURIComponent(id)));
    validator.checkFiles(Object.fromEntries(present.map((id) => [id, { exists: true, inCrate: false }])));
  }
  return validator.results
    .filter(({ status }: Json) => status === 'error')
    .map(({ id, entity }: Json) => [id, entity].filter(Boolean).join(' '));
}

/** N-Quads by jsonld in safe mode, which refuses every term that the context does not define. */
async function quadsOf(text: string): Promise<string[]> {
  const context = JSON.parse(readFileSync(join(roCrate.folder, 'lib/context.json'), 'utf8'));
  const documentLoader = async (url: string) => {
    if (url !== address) throw new Error(`not to be fetched: ${url}`);
    return { documentUrl: url, document: context };
  };
  const quads: string = await require(jsonld.folder).toRDF(JSON.parse(text), {
    documentLoader,
    base: 'http://crate.example/',
    format: 'application/n-quads',
    safe: true,
  });
  return quads.trim().split('\n');
}

describe.each(['example', 'awkward'])('the crate of the %s project', (name) => {
  it.skipIf(!roCrate.available)('satisfies the ro-crate validator', () => {
    expect(faultsOf(name)).toEqual([]);
  });

  it.skipIf(!roCrate.available)('is refused when it is broken', () => {
    const broken = changed(name, (graph) => {
      const root = entity(graph, './');
      root.license = undefined;
      root.datePublished = ['2025-03-12', '2025-03-13'];
    });
    expect(faultsOf(name, broken)).toEqual(['licenseRequired', 'datePublishedIsString']);
    expect(faultsOf(name, undefined, 'facts.json')).toEqual(['validCrateDataEntityPath facts.json']);
  });

  it.skipIf(!jsonld.available || !roCrate.available)(
    'has no term that the context does not define',
    async () => {
      const { length } = await quadsOf(project(name).text('ro-crate-metadata.json'));
      expect(length).toBeGreaterThan(200);
      const broken = changed(name, (graph) => {
        entity(graph, './').nonsense = 'a word of ours';
      });
      await expect(quadsOf(broken)).rejects.toThrow(/Safe mode validation error/);
    },
  );

  it.skipIf(!rdflib.available || !jsonld.available)(
    'answers SPARQL questions on its root and its runs',
    async () => {
      const quads = await quadsOf(project(name).text('ro-crate-metadata.json'));
      const script = `
import sys, rdflib
graph = rdflib.Graph().parse(data=sys.stdin.read(), format='nt')
schema = 'PREFIX s: <http://schema.org/> '
for row in graph.query(schema + 'SELECT ?run (COUNT(?out) AS ?n) WHERE { <http://crate.example/> s:mentions ?a . ?a a s:CreateAction ; s:name ?run ; s:result ?out } GROUP BY ?run ORDER BY ?run'):
    print(row.run, row.n)`;
      const { stdout, stderr } = spawnSync('/usr/bin/python3', ['-c', script], {
        input: quads.join('\n'),
        encoding: 'utf8',
      });
      expect(stderr).toBe('');
      const expected = {
        example: 'Run calibrated 3\nRun dry-2050 3\nRun dry-years 3\n',
        awkward: 'Run calibrated 5\nRun dry 1\n',
      };
      expect(stdout).toBe(expected[name as 'example' | 'awkward']);
    },
  );

  it('is flat, with each entity once and nothing pointing nowhere', () => {
    const graph = graphOf(name);
    const ids = graph.map((one) => one['@id']);
    expect(new Set(ids).size).toBe(ids.length);
    for (const one of graph) {
      for (const value of Object.values(one).flatMap(listed)) {
        if (typeof value !== 'object') continue;
        expect(Object.keys(value)).toEqual(['@id']);
        if (!/^http:\/\/schema\.org\/|^https:\/\/w3id\.org\/ro\/crate\/1\.2$/.test(value['@id']))
          expect(ids).toContain(value['@id']);
      }
      for (const value of Object.values(one))
        if (Array.isArray(value)) expect(value.length).toBeGreaterThan(1);
    }
  });

  it('has a descriptor, and a root with what must be there', () => {
    const graph = graphOf(name);
    expect(entity(graph, 'ro-crate-metadata.json')).toEqual({
      '@id': 'ro-crate-metadata.json',
      '@type': 'CreativeWork',
      about: { '@id': './' },
      conformsTo: { '@id': 'https://w3id.org/ro/crate/1.2' },
    });
    const root = entity(graph, './');
    expect(root.datePublished).toBe('2025-03-12T09:00:00Z');
    for (const key of ['name', 'description']) expect(root[key]).toMatch(/\w/);
    expect(entity(graph, root.license['@id']).description).toMatch(/\w/);
    expect(root.conformsTo['@id']).toBe('https://w3id.org/ro/wfrun/process/0.5');
  });

  it('holds every document and every file of the payload, with its digest and size', () => {
    const graph = graphOf(name);
    const { documents, payload } = project(name);
    const parts = listed(entity(graph, './').hasPart).map((part) => part['@id']);
    expect(parts).toHaveLength(documents.length + payload.files.length + payload.fetched.length);
    const byName = new Map(
      graph.filter((one) => listed(one['@type']).includes('File')).map((one) => [one.name, one]),
    );
    for (const { path, sha256, bytes } of payload.files)
      expect(byName.get(path)).toMatchObject({ sha256, contentSize: String(bytes) });
    for (const { path } of documents) expect(byName.get(path).sha256).toMatch(/^[0-9a-f]{64}$/);
  });
});

describe('what a crate says', () => {
  it('of a run: what went in, what came out, who answers, when, and how', () => {
    const graph = graphOf('example');
    const run = graph.find((one) => one.name === 'Run calibrated');
    expect(run['@type']).toBe('CreateAction');
    const takes = run.object.map((one: Json) => one['@id']);
    expect(takes).toContain('repository/data/rain/high-tarrow.csv');
    expect(takes).toContain('repository/model/control.txt');
    expect(takes).not.toContain('repository/runs/calibrated/daily.csv');
    expect(run.result.map((one: Json) => one['@id'])).toEqual([
      'repository/runs/calibrated/daily.csv',
      'repository/runs/calibrated/monthly.csv',
      'repository/runs/calibrated/run.log',
    ]);
    expect(run.endTime).toBe('2025-03-02');
    expect(run.description).toBe(
      'node model/two-store.mjs --control model/control.txt --out runs/calibrated',
    );
    expect(entity(graph, run.instrument['@id'])).toMatchObject({ name: 'two-store', version: '1.4.2' });
    expect(entity(graph, run.agent['@id'])).toMatchObject({
      '@type': 'Organization',
      name: 'Northmere Catchment Office',
    });
  });

  it('of the place and the time', () => {
    const graph = graphOf('example');
    const root = entity(graph, './');
    expect(root.temporalCoverage).toBe('2001-10-01/2015-09-30');
    const place = entity(graph, root.contentLocation['@id']);
    expect(place).toMatchObject({ name: 'Fennock Water at Old Mill', longitude: -2.41, latitude: 54.63 });
    expect(entity(graph, place.geo['@id']).asWKT).toBe('POINT (-2.41 54.63)');
  });

  it('of a person with an ORCID, and of the body behind', () => {
    const graph = graphOf('awkward');
    const person = entity(graph, 'https://orcid.org/0000-0002-1825-0097');
    expect(person['@type']).toBe('Person');
    expect(entity(graph, person.affiliation['@id'])).toMatchObject({
      '@type': 'Organization',
      email: 'models@eastmoor.example',
    });
  });

  it('of names that need encoding, and of files that are not in the bag', () => {
    const graph = graphOf('awkward');
    const named = (path: string) => graph.find((one) => one.name === path)['@id'];
    expect(named(awkwardNames.rain)).toBe(
      'repository/data/rain%20gauge%2050%25%20%231%20(a),%20%5Bb%5D;%20c=d&e.csv',
    );
    expect(named(awkwardNames.flow)).toBe('repository/data/Πηνειός/流量%20%E2%80%93%20Ærø.csv');
    expect(named(awkwardNames.output)).toBe(
      'repository/runs/calibrated/extra%0Aline%20%22quoted%22%20%250A.csv',
    );
    const fetched = entity(graph, 'https://data.eastmoor.example/radar/a%20b.nc?x=1%7C2');
    expect(fetched).toMatchObject({
      sha256: 'ab'.repeat(32),
      contentSize: '17',
      localPath: 'repository/radar/a b%20c.nc',
    });
    for (const path of ['radar/old.nc', awkwardNames.lfs]) {
      expect(named(path)).toMatch(/^#file-/);
      expect(listed(entity(graph, './').hasPart)).not.toContainEqual({ '@id': named(path) });
    }
    expect(graph.find((one) => one.name === 'radar/old.nc').description).toContain('shelf 7, box "B"');
  });

  it('of a command, so that a shell takes it as it was', () => {
    const start = ['node', "it's", 'a\\b', '$HOME', ''] as const;
    expect(commandLine({ start: [...start], folder: 'model' })).toBe(
      `node 'it'\\''s' 'a\\b' '$HOME' '' (in model)`,
    );
  });
});
