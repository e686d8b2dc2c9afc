import { readFileSync, writeFileSync } from 'node:fs';

/** Reads a table with one header line, comma- or blank-separated: one object of texts for each row. */
export function readTable(path) {
  const lines = readFileSync(path, 'utf8').split('\n');
  const rows = lines.filter((line) => line !== '' && !line.startsWith('#')).map(cells);
  const [names, ...body] = rows;
  return body.map((row) => Object.fromEntries(names.map((name, place) => [name, row[place]])));
}

/** Writes columns (name -> values, all of one length) as comma-separated text; a missing value is an empty text. */
export function writeTable(path, columns) {
  const names = Object.keys(columns);
  const rows = Array.from(columns[names[0]], (_, row) => names.map((name) => columns[name][row]).join(','));
  writeFileSync(path, `${[names.join(','), ...rows].join('\n')}\n`);
}

/** Reads lines of a key and its value as an object of texts. */
export function readKeys(path) {
  const lines = readFileSync(path, 'utf8').split('\n');
  return Object.fromEntries(lines.filter((line) => line !== '' && !line.startsWith('#')).map(cells));
}

const factors = [1, 10, 100, 1000, 10_000];

/** To the nearest step of that many decimals: 2.34567 to 2.346 with 3 decimals (4 at most). */
export function round(value, decimals) {
  const factor = factors[decimals];
  return Math.round(value * factor) / factor;
}

function cells(line) {
  return line.includes(',') ? line.split(',') : line.trim().split(/\s+/);
}
