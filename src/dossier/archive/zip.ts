import { once } from 'node:events';
import { Readable } from 'node:stream';
import { ZipFile } from 'yazl';
import type { PackedFile } from '../package/packed-file.ts';

/** Zip stores the hour of the local clock; this one's is that of UTC. */
class UtcDate extends Date {
  override getFullYear = () => this.getUTCFullYear();
  override getMonth = () => this.getUTCMonth();
  override getDate = () => this.getUTCDate();
  override getHours = () => this.getUTCHours();
  override getMinutes = () => this.getUTCMinutes();
  override getSeconds = () => this.getUTCSeconds();
}

/** A zip archive with everything below one folder, all dated alike; not compressed, for the reason that `gzipStored` gives. */
export async function* zipOf(
  files: AsyncIterable<PackedFile>,
  top: string,
  date: Date,
): AsyncGenerator<Uint8Array> {
  const zip = new ZipFile();
  const output = zip.outputStream as Readable;
  zip.on('error', (error: Error) => output.destroy(error));
  const filled = fill(zip, files, top, new UtcDate(date)).catch((error: Error) => output.destroy(error));
  for await (const chunk of output) yield chunk as Uint8Array;
  await filled;
}

async function fill(zip: ZipFile, files: AsyncIterable<PackedFile>, top: string, date: Date): Promise<void> {
  for await (const { path, bytes, executable, chunks } of files) {
    const options = {
      ...{ mtime: date, mode: executable ? 0o100755 : 0o100644 },
      ...{ compress: false, size: bytes },
    };
    const source = Readable.from(copied(chunks()));
    zip.addReadStream(source, `${top}/${path}`, options);
    await once(source, 'end');
  }
  zip.end();
}

async function* copied(chunks: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  for await (const chunk of chunks) yield Buffer.from(chunk);
}
