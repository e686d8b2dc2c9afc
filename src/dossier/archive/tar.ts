import { type Pack, pack } from 'tar-stream';
import type { PackedFile } from '../package/packed-file.ts';

/** A tar archive with everything below one folder, all dated alike, of nobody. */
export async function* tarOf(
  files: AsyncIterable<PackedFile>,
  top: string,
  date: Date,
): AsyncGenerator<Uint8Array> {
  const tar = pack();
  const filled = fill(tar, files, top, date).catch((error: Error) => tar.destroy(error));
  for await (const chunk of tar) yield chunk as Uint8Array;
  await filled;
}

async function fill(tar: Pack, files: AsyncIterable<PackedFile>, top: string, date: Date): Promise<void> {
  for await (const { path, bytes, executable, chunks } of files) {
    await new Promise<void>((resolve, reject) => {
      const header = {
        ...{ name: `${top}/${path}`, size: bytes, mode: executable ? 0o755 : 0o644, mtime: date },
        ...{ uid: 0, gid: 0, uname: '', gname: '' },
      };
      const entry = tar.entry(header, (error) => (error ? reject(error) : resolve()));
      entry.on('error', reject);
      write(entry, chunks()).catch(reject);
    });
  }
  tar.finalize();
}

async function write(entry: NodeJS.WritableStream, chunks: AsyncIterable<Uint8Array>): Promise<void> {
  for await (const chunk of chunks) {
    // The archive may hold it back until it is read.
    if (!entry.write(Buffer.from(chunk))) await new Promise((resolve) => entry.once('drain', resolve));
  }
  entry.end();
}
