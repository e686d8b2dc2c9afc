import { hash, randomUUID } from 'node:crypto';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { dirname } from 'node:path';

/**
 * The text of a disposable memory: a line that names what it holds, the lines, and last the digest of all lines before,
 * so that a torn or altered file shows.
 */
export function keptText(firstLine: string, lines: readonly string[]): string {
  const body = `${firstLine}\n${lines.map((line) => `${line}\n`).join('')}`;
  return `${body}${digestOf(body)}\n`;
}

/** The lines of a memory; none for a text that is not exactly as `keptText` wrote it. */
export function linesOfKept(firstLine: string, text: string): string[] {
  const end = text.lastIndexOf('\n', text.length - 2) + 1;
  const body = text.slice(0, end);
  if (!body.startsWith(`${firstLine}\n`) || text.slice(end) !== `${digestOf(body)}\n`) return [];
  return body.split('\n').slice(1, -1);
}

/** The lines kept in a file; none where there is no such file, or a broken one. */
export async function loadLines(file: string, firstLine: string): Promise<string[]> {
  return linesOfKept(firstLine, await readFile(file, 'utf8').catch(() => ''));
}

/** Puts the file in place at once, whole, or not at all where the folder cannot be written: the memory is disposable. */
export async function saveLines(file: string, firstLine: string, lines: readonly string[]): Promise<void> {
  const temporary = `${file}.${randomUUID()}`;
  try {
    await mkdir(dirname(file), { recursive: true });
    await writeFile(temporary, keptText(firstLine, lines));
    await rename(temporary, file);
  } catch {
    await rm(temporary, { force: true }).catch(() => {});
  }
}

const digestOf = (text: string) => hash('sha256', text, 'hex');
