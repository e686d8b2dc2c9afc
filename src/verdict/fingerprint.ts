import { createHash } from 'node:crypto';

/** Tells one finding from all others of its manifest, and stays when wording, figures or lines change. */
export function fingerprint(rule: string, record: string, subject: string): string {
  return createHash('sha256').update(`${rule}\0${record}\0${subject}`).digest('hex').slice(0, 16);
}
