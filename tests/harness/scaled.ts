/** Multiplies a column of a table with a comma between cells, in rows whose first cell begins with one of the texts. */
export function scaled(
  column: string,
  factor: number,
  begins: readonly string[] = [''],
): (table: string) => string {
  return (table) => {
    const [head = '', ...rows] = table.trimEnd().split('\n');
    const place = head.split(',').indexOf(column);
    if (place < 0) throw new Error(`the table has no column ${column}`);
    const changed = rows.map((row) => {
      if (!begins.some((text) => row.startsWith(text))) return row;
      const cells = row.split(',');
      return cells.with(place, (Number(cells[place]) * factor).toFixed(4)).join(',');
    });
    return `${[head, ...changed].join('\n')}\n`;
  };
}
