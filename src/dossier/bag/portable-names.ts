const devices = /^(?:con|prn|aux|nul|com[0-9¹²³]|lpt[0-9¹²³])(?:\.|$)/i;
// Line breaks are let through: BagIt has a way to write them, and Unix archives hold them.
const reserved = /[<>:"|?*\\]|(?![\t\n\r])\p{Cc}/u;

/**
 * Why paths can't all be unpacked on every common system, one sentence for each; empty when they can. Names that differ only in
 * case or in the Unicode form of their letters fall together on some disks, others are reserved on Windows (RFC 8493, 6.1).
 */
export function portabilityProblems(paths: readonly string[]): readonly string[] {
  const problems: string[] = [];
  const spelled = new Map<string, string>();
  for (const path of paths) {
    const parts = path.split('/');
    const bad = parts.find((part) => devices.test(part) || reserved.test(part) || /[. ]$/.test(part));
    if (bad !== undefined) problems.push(`${JSON.stringify(path)}: ${whyReserved(bad)}`);
    for (const place of parts.keys()) {
      const above = parts.slice(0, place + 1).join('/');
      const folded = above.normalize('NFC').toLowerCase();
      const before = spelled.get(folded);
      if (before === undefined) spelled.set(folded, above);
      else if (before !== above) {
        const how = before.normalize('NFC') === above.normalize('NFC') ? 'the form of an accent' : 'case';
        problems.push(
          `${JSON.stringify(above)} and ${JSON.stringify(before)} differ only in ${how}, and are one name on some disks`,
        );
        spelled.set(folded, above);
      }
    }
  }
  return problems;
}

function whyReserved(name: string): string {
  if (name.includes('\\'))
    return 'a backslash parts folders on Windows (git may write it for a byte that is not UTF-8)';
  if (devices.test(name)) return `${JSON.stringify(name)} is the name of a device on Windows`;
  if (reserved.test(name))
    return `${JSON.stringify(name)} holds a character that Windows does not allow in names`;
  return `${JSON.stringify(name)} ends in a point or a space, which Windows drops`;
}
