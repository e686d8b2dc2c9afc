import { mkdir, mkdtemp, realpath, rm, symlink, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { fileBeside } from './beside.ts';
import { forgetfulValues } from './value-memory.ts';

/** SHA-256 of `abc`: FIPS 180-4, first example of the algorithm. */
const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';

describe('a file beside git', () => {
  let folder: string;
  let top: string;
  beforeEach(async () => {
    folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
    top = join(folder, 'top');
    await mkdir(join(top, 'radar'), { recursive: true });
    await writeFile(join(top, 'radar/2001.nc'), 'abc');
    await writeFile(join(folder, 'outside.nc'), 'abc');
  });
  afterEach(() => rm(folder, { recursive: true, force: true }));

  it('is told by size and SHA-256', async () => {
    const { remember } = forgetfulValues();
    expect(await fileBeside(top, 'radar/2001.nc', remember)).toEqual({ bytes: 3, sha256: abc });
  });

  it('is null where nothing, or no file, lies there', async () => {
    const { remember } = forgetfulValues();
    expect(await fileBeside(top, 'radar/2002.nc', remember)).toBeNull();
    expect(await fileBeside(top, 'radar', remember)).toBeNull();
  });

  it('is never outside the repository', async () => {
    const { remember } = forgetfulValues();
    await symlink(join(folder, 'outside.nc'), join(top, 'link.nc'));
    expect(await fileBeside(top, '../outside.nc', remember)).toBeNull();
    expect(await fileBeside(top, 'link.nc', remember)).toBeNull();
  });

  it('is hashed again only when it changed', async () => {
    const { remember } = forgetfulValues();
    let hashed = 0;
    const counting: typeof remember = (key, compute) =>
      remember(key, () => {
        hashed++;
        return compute();
      });
    await fileBeside(top, 'radar/2001.nc', counting);
    await fileBeside(top, 'radar/2001.nc', counting);
    expect(hashed).toBe(1);
    await writeFile(join(top, 'radar/2001.nc'), 'abd');
    await utimes(join(top, 'radar/2001.nc'), 1, 1);
    const changed = await fileBeside(top, 'radar/2001.nc', counting);
    expect([hashed, changed?.sha256 === abc]).toEqual([2, false]);
  });
});
