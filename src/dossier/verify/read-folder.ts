import { constants } from 'node:fs';
import { open, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { Failure } from '../../failure.ts';
import type { FoundEntry } from './found-entry.ts';

const pieceBytes = 1024 * 1024;

/** Every file below a folder; links are told and never followed. */
export async function* readFolder(folder: string): AsyncGenerator<FoundEntry> {
  const waiting = [''];
  for (let below = waiting.pop(); below !== undefined; below = waiting.pop()) {
    const entries = await readdir(join(folder, below), { withFileTypes: true }).catch((cause: unknown) => {
      throw unreadable(join(folder, below), cause);
    });
    for (const entry of entries) {
      const path = below === '' ? entry.name : `${below}/${entry.name}`;
      if (entry.isDirectory()) waiting.push(path);
      else if (entry.isFile()) yield { path, kind: 'file', chunks: () => contentOf(join(folder, path)) };
      else yield { path, kind: entry.isSymbolicLink() ? 'link' : 'other', chunks: nothing };
    }
  }
}

async function* contentOf(path: string): AsyncGenerator<Uint8Array> {
  const file = await open(path, constants.O_RDONLY | constants.O_NOFOLLOW).catch((cause: unknown) => {
    throw unreadable(path, cause);
  });
  try {
    const piece = Buffer.allocUnsafe(pieceBytes);
    for (;;) {
      const { bytesRead } = await file.read(piece, 0, pieceBytes);
      if (bytesRead === 0) return;
      yield piece.subarray(0, bytesRead);
    }
  } finally {
    await file.close();
  }
}

export async function* nothing(): AsyncGenerator<Uint8Array> {}

function unreadable(path: string, cause: unknown): Failure {
  const reason = cause instanceof Error ? cause.message : String(cause);
  return new Failure(
    'unreadable-file',
    `${path} could not be read (${reason}).`,
    'Check its permissions.',
    cause,
  );
}
