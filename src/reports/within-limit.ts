/**
 * The report on as many items, taken from the first, as the limit of a host lets through: what is over it is refused whole
 * there. `render` is given how many were left out.
 */
export function withinLimit<Item>(
  items: readonly Item[],
  render: (shown: readonly Item[], left: number) => string,
  limit: number,
  size: (report: string) => number = Buffer.byteLength,
): string {
  let shown = items;
  for (;;) {
    const report = render(shown, items.length - shown.length);
    const share = limit / size(report);
    if (share >= 1 || shown.length === 0) return report;
    shown = shown.slice(0, Math.floor(shown.length * Math.min(0.95, share)));
  }
}
