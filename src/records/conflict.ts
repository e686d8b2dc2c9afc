/** The versions of a text that meet in a merge; null where there is none, or where markers do not show it. */
export interface Versions {
  readonly base: string | null;
  readonly ours: string | null;
  readonly theirs: string | null;
}

/** The line of the first conflict marker, from 1; null where there is none. */
export function conflictLine(text: string): number | null {
  const line = text.split('\n').findIndex((one) => /^<{7}( |\r?$)/.test(one));
  return line < 0 ? null : line + 1;
}

/**
 * Takes the versions out of a text with conflict markers, in git's styles `merge` (no base), `diff3` and `zdiff3`.
 * In `zdiff3` lines that both sides share are moved out of the conflict, so the base may be no whole text then.
 * Null where the markers do not close.
 */
export function takeVersions(text: string): Versions | null {
  const sides = { base: [] as string[], ours: [] as string[], theirs: [] as string[] };
  let open: keyof typeof sides | null = null;
  let hasBase = true;
  let showsBase = false;
  for (const line of text.split('\n')) {
    const [, marker] = /^(<{7}|\|{7}|={7}|>{7})(?: |\r?$)/.exec(line) ?? [];
    if (marker === '<<<<<<<' && open === null) {
      open = 'ours';
      showsBase = false;
    } else if (marker === '|||||||' && open === 'ours') {
      open = 'base';
      showsBase = true;
    } else if (marker === '=======' && (open === 'ours' || open === 'base')) {
      open = 'theirs';
      hasBase &&= showsBase;
    } else if (marker === '>>>>>>>' && open === 'theirs') open = null;
    else if (open !== null) sides[open].push(line);
    else for (const side of Object.values(sides)) side.push(line);
  }
  if (open !== null) return null;
  const [base, ours, theirs] = [sides.base, sides.ours, sides.theirs].map((lines) => lines.join('\n'));
  return { base: hasBase ? (base ?? '') : null, ours: ours ?? '', theirs: theirs ?? '' };
}
