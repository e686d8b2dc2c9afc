import { mkdir, open } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { PackedFile } from '../package/packed-file.ts';

/** Writes the files below a new folder. */
export async function writeFolder(folder: string, files: AsyncIterable<PackedFile>): Promise<void> {
  await mkdir(folder);
  for await (const { path, executable, chunks } of files) {
    const target = join(folder, path);
    await mkdir(dirname(target), { recursive: true });
    const file = await open(target, 'wx', executable ? 0o777 : 0o666);
    try {
      for await (const chunk of chunks()) await file.writeFile(chunk);
    } finally {
      await file.close();
    }
  }
}
