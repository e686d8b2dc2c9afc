import { createHash } from 'node:crypto';
import { symlink } from 'node:fs/promises';
import { join } from 'node:path';
import { type TemporaryRepository, temporaryRepository } from '../harness/repository.ts';

export const sha256 = (content: string | Uint8Array): string =>
  createHash('sha256').update(content).digest('hex');

/** Content that only the pointer knows of, and content that a Git LFS folder holds. */
export const farContent = 'far away\n';
export const largeContent = 'a large raster\n';

/** Git LFS specification, "The Pointer". */
const pointer = (content: string): string =>
  `version https://git-lfs.github.com/spec/v1\noid sha256:${sha256(content)}\nsize ${content.length}\n`;

/** Names that packing has to take care of; all invented. */
export const awkwardNames: readonly string[] = [
  'data/rain gauge 50%.csv',
  'data/two\nlines\rthree.csv',
  'data/%0A is no line break.csv',
  'data/ Wehr Grüne Brücke.csv',
  'data/降水量/観測.csv',
  'data/ليل.csv',
  `data/${'long '.repeat(30)}name.csv`,
  'data/-rf.csv',
  'data/#hash&more;.csv',
  'data/empty.csv',
];

/** Symbolic links: to a file of the repository, and out of it. */
const links = { 'data/link.csv': 'rain gauge 50%.csv', 'data/away.csv': '../../away.csv' };

const fetchedFrom = 'https://data.northmere.example/radar 2001.nc';
export const fetchedUrl = 'https://data.northmere.example/radar%202001.nc';

/** A young study that passes, with every kind of file that a package meets. `elsewhere` adds files kept outside git. */
export async function awkwardRepository(elsewhere = true): Promise<TemporaryRepository> {
  const files = awkwardNames.map((name) => [name, name === 'data/empty.csv' ? '' : `${name}\n`] as const);
  const kept = [
    `{path: "radar/50% 2001.nc", sha256: ${sha256('radar\n')}, bytes: 6, location: "${fetchedFrom}"}`,
    `{path: radar/drive.nc, sha256: ${sha256('drive\n')}, bytes: 6, location: "shelf 3, box 12"}`,
  ];
  const repository = await temporaryRepository({
    ...Object.fromEntries(files),
    'stoplog.yaml': manifest(elsewhere ? kept : []),
    'large/far.tif': pointer(farContent),
    'large/here.tif': pointer(largeContent),
    'model/run.sh': '#!/bin/sh\n',
  });
  await repository.git('update-index', '--chmod=+x', 'model/run.sh');
  for (const [path, leadsTo] of Object.entries(links)) await symlink(leadsTo, join(repository.folder, path));
  await repository.git('add', ...Object.keys(links));
  const digest = sha256(largeContent);
  await repository.write(
    `.git/lfs/objects/${digest.slice(0, 2)}/${digest.slice(2, 4)}/${digest}`,
    largeContent,
  );
  await repository.git('commit', '--quiet', '--message', 'Executable');
  return repository;
}

function manifest(elsewhere: readonly string[]): string {
  return `stoplog: 1
study:
  title: |
    An invented brook
    in two lines
  purpose: Daily streamflow of an invented brook.
  decision: None; it is invented.
  phase: setup
model:
  name: pond
  version: "1.0"
  release: "1.0.0"
${
  elsewhere.length === 0
    ? ''
    : `inputs:
  radar:
    role: terrain
    stored: elsewhere
    files:
${elsewhere.map((file) => `      - ${file}`).join('\n')}
    source: {provider: Northmere Radar, title: Composite, url: "https://data.northmere.example", licence: CC-BY-4.0, retrieved: 2020-01-20}
    grid: {cell: 1000, unit: m, crs: "EPSG:27700"}
`
}`;
}
