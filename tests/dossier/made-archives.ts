import { crc32, gzipSync } from 'node:zlib';
import { type Header, pack } from 'tar-stream';

export interface MadeEntry {
  readonly path: string;
  readonly content?: string | Uint8Array;
  /** Of Unix, with the type; an ordinary file where it is left out. */
  readonly mode?: number;
  /** Already compressed content, with the size that it claims to have. */
  readonly deflated?: { readonly data: Uint8Array; readonly claims: number };
}

/** A zip archive written byte by byte (PKWARE APPNOTE 4.3), so that it can hold what no library would write. */
export function madeZip(entries: readonly MadeEntry[]): Buffer {
  const locals: Buffer[] = [];
  const central: Buffer[] = [];
  let offset = 0;
  for (const { path, content = '', mode = 0o100644, deflated } of entries) {
    const name = Buffer.from(path);
    const plain = Buffer.from(content);
    const data = deflated?.data ?? plain;
    const shared = Buffer.alloc(26);
    shared.writeUInt16LE(20, 0);
    shared.writeUInt16LE(0x800, 2);
    shared.writeUInt16LE(deflated === undefined ? 0 : 8, 4);
    shared.writeUInt32LE(0x5a210000, 6);
    shared.writeUInt32LE(crc32(plain), 10);
    shared.writeUInt32LE(data.length, 14);
    shared.writeUInt32LE(deflated?.claims ?? plain.length, 18);
    shared.writeUInt16LE(name.length, 22);
    const local = Buffer.concat([Buffer.from('PK\x03\x04'), shared, name, data]);
    const rest = Buffer.alloc(14);
    rest.writeUInt32LE((mode << 16) >>> 0, 6);
    rest.writeUInt32LE(offset, 10);
    central.push(Buffer.concat([Buffer.from('PK\x01\x02'), Buffer.from([20, 3]), shared, rest, name]));
    locals.push(local);
    offset += local.length;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(18);
  end.writeUInt16LE(entries.length, 4);
  end.writeUInt16LE(entries.length, 6);
  end.writeUInt32LE(directory.length, 8);
  end.writeUInt32LE(offset, 12);
  return Buffer.concat([...locals, directory, Buffer.from('PK\x05\x06'), end]);
}

/** A `.tar.gz` of headers as they are given. */
export async function madeTar(
  entries: readonly (Partial<Header> & { readonly name: string; readonly content?: string })[],
): Promise<Buffer> {
  const tar = pack();
  for (const { content = '', ...header } of entries) tar.entry(header, content);
  tar.finalize();
  const chunks: Uint8Array[] = [];
  for await (const chunk of tar) chunks.push(chunk as Uint8Array);
  return gzipSync(Buffer.concat(chunks));
}
