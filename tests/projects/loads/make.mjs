// Makes all data of this project, which are invented, and runs its model: `node make.mjs` in this folder, or with another
// folder as its one argument. Files have semicolons between columns and decimal commas, as many offices write them.
import { mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { areasKm2, runModel, simulate } from './model/loads.mjs';

const top = process.argv[2] ?? import.meta.dirname;
const months = Array.from({ length: 144 }, (_, place) => ({
  year: 2000 + Math.floor(place / 12),
  month: (place % 12) + 1,
}));

/** The same numbers between 0 and 1 on every machine (Park and Miller 1988, from memory). */
function random(seed) {
  let state = seed;
  return () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
}

function write(path, lines) {
  mkdirSync(dirname(join(top, path)), { recursive: true });
  writeFileSync(join(top, path), `${lines.join('\n')}\n`);
}

const comma = (value, decimals) => value.toFixed(decimals).replace('.', ',');
const label = ({ year, month }) => `${year}-${String(month).padStart(2, '0')}`;

const wet = random(14);
const rain = months.map(
  ({ month }) =>
    Math.round(10 * (70 + 25 * Math.cos((2 * Math.PI * (month - 12)) / 12)) * (0.4 + 1.2 * wet())) / 10,
);
/** Arable land as a share of the area; it went up and down with prices. */
const arable = [0.4, 0.41, 0.42, 0.38, 0.44, 0.4, 0.45, 0.43, 0.41, 0.44, 0.42, 0.4];
const dry = random(1);
const takenM3 = months.map(({ month }) =>
  month >= 5 && month <= 9 ? Math.round(9000 + 6000 * dry()) : 2000,
);

write('data/rain.csv', [
  'month;rain_mm',
  ...months.map((one, place) => `${label(one)};${comma(rain[place], 1)}`),
]);
write('data/withdrawals.csv', [
  'month;taken_m3',
  ...months.map((one, place) => `${label(one)};${takenM3[place]}`),
]);
const cover = (shares) => [
  'year;arable;grass;forest',
  ...shares.map((share, place) => `${2000 + place};${comma(share, 2)};${comma(0.8 - share, 2)};0,20`),
];
write('data/land-cover.csv', cover(arable));
write('data/land-cover-more.csv', cover(arable.map((share) => share + 0.06)));

// What was "observed": the model with other constants, and chance.
const truth = simulate({
  rain,
  takenM3,
  arable: months.map(({ year }) => arable[year - 2000]),
  parameters: { drain_share: 0.33, sediment_factor: 1.2, sediment_power: 1.55, phosphorus_factor: 2.1 },
});
const chance = random(23);
const missing = { 'sediment lower': [40, 41], 'phosphorus upper': [77] };
for (const gauge of Object.keys(areasKm2)) {
  for (const [quantity, unit] of [
    ['sediment', 't'],
    ['phosphorus', 'kg'],
  ]) {
    const rows = months.map((one, place) => {
      const value = truth[place][gauge][quantity] * (0.85 + 0.3 * chance());
      const isMissing = missing[`${quantity} ${gauge}`]?.includes(place);
      return `${label(one)};${isMissing ? '' : comma(value, 2)}`;
    });
    write(`data/${quantity}/${gauge}.csv`, [`month;load_${unit}`, ...rows]);
  }
}

runModel(top, 'model/control.txt', 'runs/present');
runModel(top, 'model/control-more.txt', 'runs/more-arable');
