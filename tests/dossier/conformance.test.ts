import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { verifyPackage } from '../../src/dossier/verify/verify-package.ts';

/** Bags of the Library of Congress BagIt conformance suite, version 1.0; see the README beside them. */
const folder = join(import.meta.dirname, 'conformance', 'v1.0');

describe('bags of the conformance suite', () => {
  it.each(readdirSync(join(folder, 'valid')))('%s is valid', async (name) => {
    expect(await verifyPackage(join(folder, 'valid', name))).toMatchObject({ status: 'valid', problems: [] });
  });

  it.each(readdirSync(join(folder, 'invalid')))('%s is not', async (name) => {
    const { status, problems } = await verifyPackage(join(folder, 'invalid', name));
    expect(['broken', 'incomplete']).toContain(status);
    expect(problems).not.toEqual([]);
  });

  // What each is about, by the names of their folders and the words in their payload.
  it.each([
    ['bagit-with-invalid-whitespace', 'bagit.txt', /expected the two lines/],
    ['notAllManifestsListAllFiles', 'data/missingFromManifest.txt', /is not listed in manifest-sha512\.txt/],
    [
      'same-filename-listed-twice-with-different-hashes',
      'manifest-sha256.txt',
      /"data\/README" for the second time/,
    ],
    [
      'same-filename-listed-twice-with-the-same-hash',
      'manifest-sha256.txt',
      /"data\/README" for the second time/,
    ],
  ])('%s for its own reason', async (name, file, message) => {
    const { problems } = await verifyPackage(join(folder, 'invalid', name));
    expect(problems).toContainEqual(
      expect.objectContaining({ file, message: expect.stringMatching(message) }),
    );
  });
});
