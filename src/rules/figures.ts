/** A figure for people: whole from 1 000 on, else four digits that count; thousands parted by a blank. */
export function figure(value: number): string {
  const rounded = Math.abs(value) >= 1000 ? Math.round(value) : Number(value.toPrecision(4));
  const [whole = '', places] = String(rounded).split('.');
  const parted = whole.replace(/\B(?=(?:\d{3})+$)/g, ' ');
  return places === undefined ? parted : `${parted}.${places}`;
}

/** The first few of a list, and how many more there are: `a, b, c and 297 more`. */
export function few(names: readonly string[], shown = 3): string {
  const more = names.length - shown;
  return `${names.slice(0, shown).join(', ')}${more > 0 ? ` and ${more} more` : ''}`;
}
