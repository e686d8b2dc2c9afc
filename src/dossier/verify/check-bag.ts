import { compareDigests, unlisted } from './compare-digests.ts';
import type { PackageProblem, PackageReport } from './findings.ts';
import type { Inventory } from './inventory.ts';
import { fetchName, type ReadFetch, readFetch } from './read-fetch.ts';
import { linesOf, type ReadManifest, readManifest } from './read-manifest.ts';

type Checked = Pick<PackageReport, 'problems' | 'awaited' | 'notes'>;

/** The rules of BagIt 1.0 (RFC 8493, 2 and 3). */
export function checkBag(inventory: Inventory): Checked {
  const { files } = inventory;
  const named = (pattern: RegExp) =>
    [...files.keys()]
      .filter((path) => pattern.test(path))
      .sort()
      .map((path) => readManifest(path, files.get(path)?.text ?? null));
  const payload = named(/^manifest-[a-z0-9]+\.txt$/);
  const tags = named(/^tagmanifest-[a-z0-9]+\.txt$/);
  const fetch = files.has(fetchName)
    ? readFetch(files.get(fetchName)?.text ?? null)
    : { files: new Map<string, never>(), problems: [] };
  const inData = [...files.keys()].filter((path) => path.startsWith('data/'));
  const unchecked = [...payload, ...tags].filter(({ algorithm }) => !/^sha(?:256|512)$/.test(algorithm));
  return {
    problems: [
      ...declarationProblems(files.get('bagit.txt')?.text),
      ...(payload.some((manifest) => !unchecked.includes(manifest))
        ? []
        : [incomplete('manifest-sha256.txt', 'there is no payload manifest by SHA-256 or SHA-512')]),
      ...[...payload, ...tags].flatMap(({ problems }) => problems),
      ...fetch.problems,
      ...payload.flatMap((manifest) => payloadProblems(manifest, inData, inventory, fetch)),
      ...tags.flatMap((manifest) => tagProblems(manifest, payload, inventory)),
      ...oxumProblems(inventory, inData, fetch),
    ],
    awaited: [...fetch.files].flatMap(([file, { url }]) => (files.has(file) ? [] : [{ file, url }])),
    notes: unchecked.map(
      ({ name }) => `The digests in ${name} were not checked; only SHA-256 and SHA-512 are.`,
    ),
  };
}

function declarationProblems(text: string | null | undefined): readonly PackageProblem[] {
  if (text === undefined) return [incomplete('bagit.txt', 'is not there, and every bag has it')];
  const [version, encoding, ...more] = linesOf(text ?? '');
  const expected = ['BagIt-Version: 1.0', 'Tag-File-Character-Encoding: UTF-8'];
  return version === expected[0] && encoding === expected[1] && more.length === 0
    ? []
    : [
        broken(
          'bagit.txt',
          `expected the two lines ${expected.map((line) => JSON.stringify(line)).join(' and ')}, found ${JSON.stringify((text ?? '').slice(0, 200))}`,
        ),
      ];
}

function payloadProblems(
  manifest: ReadManifest,
  inData: readonly string[],
  inventory: Inventory,
  fetch: ReadFetch,
): readonly PackageProblem[] {
  const outside = [...manifest.digests.keys()].filter((path) => !path.startsWith('data/'));
  const notAwaited = [...fetch.files.keys()].filter((path) => !manifest.digests.has(path));
  return [
    ...outside.map((path) =>
      broken(manifest.name, `lists ${JSON.stringify(path)}, which lies outside data/`),
    ),
    ...notAwaited.map((path) =>
      broken(fetchName, `lists ${JSON.stringify(path)}, which ${manifest.name} does not`),
    ),
    ...compareDigests(manifest, inventory, fetch.files),
    ...unlisted(manifest, inData),
  ];
}

function tagProblems(
  manifest: ReadManifest,
  payload: readonly ReadManifest[],
  inventory: Inventory,
): readonly PackageProblem[] {
  const wrong = [...manifest.digests.keys()].filter((path) => /^(?:data\/|tagmanifest-)/.test(path));
  return [
    ...wrong.map((path) =>
      broken(manifest.name, `lists ${JSON.stringify(path)}, which is no tag file that it may list`),
    ),
    ...compareDigests(manifest, inventory),
    ...unlisted(
      manifest,
      payload.map(({ name }) => name),
    ),
  ];
}

/** `Payload-Oxum` of `bag-info.txt`: bytes and number of the payload's files, those to be fetched too (2.2.2). */
function oxumProblems(
  { files }: Inventory,
  inData: readonly string[],
  fetch: ReadFetch,
): readonly PackageProblem[] {
  const stated = linesOf(files.get('bag-info.txt')?.text ?? '').flatMap((line) => {
    const value = /^payload-oxum:\s*(.*?)\s*$/i.exec(line)?.[1];
    return value === undefined ? [] : [value];
  });
  const awaited = [...fetch.files].filter(([path]) => !files.has(path)).map(([, { bytes }]) => bytes);
  if (stated.length === 0 || awaited.includes(null)) return [];
  const sizes = [...inData.map((path) => files.get(path)?.bytes ?? 0), ...awaited.map((bytes) => bytes ?? 0)];
  const found = `${sizes.reduce((sum, bytes) => sum + bytes, 0)}.${sizes.length}`;
  return stated.length === 1 && stated[0] === found
    ? []
    : [incomplete('bag-info.txt', `says Payload-Oxum ${stated.join(' and ')}, found ${found} (bytes.files)`)];
}

function broken(file: string, message: string): PackageProblem {
  return { kind: 'broken', file, message };
}

function incomplete(file: string, message: string): PackageProblem {
  return { kind: 'incomplete', file, message };
}
