import { stat } from 'node:fs/promises';
import { Failure } from '../../failure.ts';
import { formOf } from '../archive/target.ts';
import { plainManifest } from '../package/plain-files.ts';
import { checkAgreement } from './agreement.ts';
import { checkBag } from './check-bag.ts';
import { compareDigests, unlisted } from './compare-digests.ts';
import { type Limits, ordinaryLimits, type PackageReport } from './findings.ts';
import { type Inventory, takeInventory } from './inventory.ts';
import { readFolder } from './read-folder.ts';
import { readManifest } from './read-manifest.ts';
import { readTar } from './read-tar.ts';
import { readZip } from './read-zip.ts';

/**
 * Reads a package back without unpacking it: a bag, or documents with a list of their digests; a folder, `.zip` or `.tar.gz`.
 * Throws Failure 'unreadable-file' where there is none or the disk refuses it.
 */
export async function verifyPackage(target: string, limits: Limits = ordinaryLimits): Promise<PackageReport> {
  const inventory = await openPackage(target, limits);
  const { files } = inventory;
  const isPlain = !files.has('bagit.txt') && files.has(plainManifest) && !hasData(inventory);
  const { problems, awaited, notes } = isPlain ? checkPlain(inventory) : checkBag(inventory);
  const agreement = checkAgreement(inventory, isPlain ? '' : 'data/');
  const all = [...inventory.problems, ...problems, ...agreement.problems].sort(
    (a, b) => compare(a.kind, b.kind) || compare(a.file, b.file),
  );
  return {
    status: all[0]?.kind ?? (awaited.length > 0 ? 'awaiting fetch' : 'valid'),
    problems: all,
    awaited,
    notes: [...notes, ...agreement.notes],
    read: files.size,
  };
}

async function openPackage(target: string, limits: Limits): Promise<Inventory> {
  const found = await stat(target).catch((cause: unknown) => {
    const reason = cause instanceof Error ? cause.message : String(cause);
    throw new Failure(
      'unreadable-file',
      `${target} could not be read (${reason}).`,
      'Name a dossier that is there.',
      cause,
    );
  });
  if (found.isDirectory()) return takeInventory(target, readFolder(target), limits, Number.POSITIVE_INFINITY);
  const form = formOf(target);
  if (form === 'folder') {
    throw new Failure(
      'usage',
      `${target} is neither a folder nor a .zip nor a .tar.gz.`,
      'Name one of these.',
    );
  }
  const maximumBytes = Math.max(limits.grownBytes, found.size * limits.growth);
  const entries = form === 'zip' ? readZip(target) : readTar(target, maximumBytes);
  return takeInventory(target, entries, limits, maximumBytes);
}

function hasData({ files }: Inventory): boolean {
  return [...files.keys()].some((path) => path.startsWith('data/'));
}

function checkPlain(inventory: Inventory): Pick<PackageReport, 'problems' | 'awaited' | 'notes'> {
  const { files } = inventory;
  const manifest = readManifest(plainManifest, files.get(plainManifest)?.text ?? null);
  const others = [...files.keys()].filter((path) => path !== plainManifest);
  const problems = [
    ...manifest.problems,
    ...compareDigests(manifest, inventory),
    ...unlisted(manifest, others),
  ];
  return { problems, awaited: [], notes: [] };
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
