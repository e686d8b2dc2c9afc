import { crc32 } from 'node:zlib';

const blockBytes = 65_535;

/**
 * The gzip format (RFC 1952) around stored blocks (RFC 1951, 3.2.4), of a size that does not depend on how the input comes in
 * pieces. Not compressed: compressors give other bytes on other machines and in other versions of Node.
 */
export async function* gzipStored(chunks: AsyncIterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  // No name, no time, no flags, unknown system.
  yield Uint8Array.of(0x1f, 0x8b, 8, 0, 0, 0, 0, 0, 0, 255);
  let waiting = Buffer.alloc(0);
  let checksum = 0;
  let bytes = 0;
  for await (const chunk of chunks) {
    checksum = crc32(chunk, checksum);
    bytes += chunk.length;
    waiting = Buffer.concat([waiting, chunk]);
    while (waiting.length > blockBytes) {
      yield block(waiting.subarray(0, blockBytes), false);
      waiting = waiting.subarray(blockBytes);
    }
  }
  yield block(waiting, true);
  const trailer = Buffer.alloc(8);
  trailer.writeUInt32LE(checksum, 0);
  trailer.writeUInt32LE(bytes % 2 ** 32, 4);
  yield trailer;
}

function block(content: Uint8Array, last: boolean): Uint8Array {
  const header = Buffer.alloc(5);
  header.writeUInt8(last ? 1 : 0, 0);
  header.writeUInt16LE(content.length, 1);
  header.writeUInt16LE(0xffff - content.length, 3);
  return Buffer.concat([header, content]);
}
