import type { Run } from '../../manifest/data.generated.ts';

/** The words of a run's command as a POSIX shell takes them; undefined where no command is stated. */
export function commandLine({ start, folder }: Pick<Run, 'start' | 'folder'>): string | undefined {
  if (start === undefined) return undefined;
  const words = start.map((word) =>
    /^[\w@%+=:,./-]+$/.test(word) ? word : `'${word.replaceAll("'", "'\\''")}'`,
  );
  return words.join(' ') + (folder === undefined ? '' : ` (in ${folder})`);
}
