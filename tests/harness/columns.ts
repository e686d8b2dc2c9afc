/** Rewrites a column of a table whose first column holds the date. A text is written as it stands, a number with six decimals. */
export function editColumn(
  column: string,
  change: (date: string, value: number) => number | string,
): (table: string) => string {
  return (table) => {
    const [head = '', ...rows] = table.trimEnd().split('\n');
    const place = head.split(',').indexOf(column);
    if (place < 0) throw new Error(`no column ${column}`);
    const edited = rows.map((row) => {
      const cells = row.split(',');
      const value = change(cells[0] ?? '', Number(cells[place]));
      cells[place] = typeof value === 'number' ? value.toFixed(6) : value;
      return cells.join(',');
    });
    return `${[head, ...edited].join('\n')}\n`;
  };
}

/** The hydrological year from October that holds a date, named by the year in which it ends. */
export function waterYear(date: string): number {
  return Number(date.slice(0, 4)) + (Number(date.slice(5, 7)) >= 10 ? 1 : 0);
}
