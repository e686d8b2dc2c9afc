/**
 * The name most like a mistyped one; undefined where none is close: more than a third of its letters differ.
 * Letters put in, left out, changed and swapped with the next each count once. Capitals, `-` and `_` do not count.
 */
export function nearestName(mistyped: string, names: Iterable<string>): string | undefined {
  const plain = (name: string): string => name.toLowerCase().replace(/[-_ ]/g, '');
  const wanted = plain(mistyped);
  let nearest: string | undefined;
  let least = Math.max(1, Math.floor(wanted.length / 3)) + 1;
  for (const name of names) {
    const distance = editDistance(wanted, plain(name), least);
    if (distance < least) {
      least = distance;
      nearest = name;
    }
  }
  return nearest;
}

/** Optimal string alignment distance, or `enough` where it is not below that. */
function editDistance(from: string, to: string, enough: number): number {
  if (Math.abs(from.length - to.length) >= enough) return enough;
  let before: number[] = [];
  let last = Array.from({ length: to.length + 1 }, (_, j) => j);
  for (let i = 1; i <= from.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= to.length; j += 1) {
      const same = from[i - 1] === to[j - 1] ? 0 : 1;
      let cost = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + same);
      if (i > 1 && j > 1 && from[i - 1] === to[j - 2] && from[i - 2] === to[j - 1]) {
        cost = Math.min(cost, (before[j - 2] ?? 0) + 1);
      }
      row.push(cost);
    }
    before = last;
    last = row;
  }
  return Math.min(enough, last[to.length] ?? enough);
}
