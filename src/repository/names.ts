import { isUtf8 } from 'node:buffer';

/** The NUL-ended pieces of git's `-z` output, as bytes. */
export function splitAtNul(output: Buffer): Buffer[] {
  const pieces: Buffer[] = [];
  for (let from = 0; from < output.length; ) {
    const nul = output.indexOf(0, from);
    const to = nul === -1 ? output.length : nul;
    pieces.push(output.subarray(from, to));
    from = to + 1;
  }
  return pieces;
}

/**
 * A name as text. Names are bytes to git; one that is not UTF-8 keeps its ASCII characters and has every
 * other byte written `\xHH`, so that it can be shown and matched by patterns. Content is read by object
 * id, so the bytes are not needed again.
 */
export function nameFromBytes(bytes: Buffer): string {
  if (isUtf8(bytes)) return bytes.toString('utf8');
  return bytes.toString('latin1').replace(/[\x80-\xff]/g, (byte) => `\\x${byte.charCodeAt(0).toString(16)}`);
}

/** All names of a NUL-separated list as text. */
export function namesFromOutput(output: Buffer): string[] {
  if (!isUtf8(output)) return splitAtNul(output).map(nameFromBytes);
  const names = output.toString('utf8').split('\0');
  if (names.at(-1) === '') names.pop();
  return names;
}
