import type { ColumnProfile } from '../../facts/profiles/column-profile.ts';
import type { Place } from '../../facts/profiles/places.ts';
import type { ProfiledFile } from '../../facts/profiles.ts';
import type { Listed } from '../../series/table.ts';
import { figure } from '../figures.ts';

/** `data/rain.csv`, and the column where the file has several. */
export function columnIn(file: ProfiledFile, column: ColumnProfile): string {
  return file.columns.length > 1 ? `${file.path}, column ${column.name}` : file.path;
}

/** `2001-10-05 (line 6), 2001-10-09 (line 10) and 35 more` */
export function listPlaces<Entry extends Place>(
  { total, first }: Listed<Entry>,
  tell: (entry: Entry) => string = ({ time }) => time,
  shown = 3,
): string {
  const told = first.slice(0, shown).map((entry) => `${tell(entry)} (line ${entry.line})`);
  const more = total - told.length;
  return `${told.join(', ')}${more > 0 ? ` and ${figure(more)} more` : ''}`;
}
