// An invented monthly model of water, sediment and phosphorus at two gauges: one soil store for the whole catchment, loads
// that grow with the flow and with the share of arable land. Its output is text in fixed columns.
//
//   node model/loads.mjs model/control.txt runs/present
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';

export const areasKm2 = { upper: 24, lower: 61 };

/** Water in mm and loads (t, kg) of each month, from the year 2000 on. */
export function simulate({ rain, takenM3, arable, parameters }) {
  let store = 90;
  return rain.map((rainMm, place) => {
    const month = (place % 12) + 1;
    const pet = 45 + 38 * Math.cos((2 * Math.PI * (month - 7)) / 12);
    const et = Math.min(pet, store + rainMm) * Math.min(1, (store + rainMm) / 180);
    const left = store + rainMm - et;
    const drained = parameters.drain_share * left;
    const taken = takenM3[place] / areasKm2.lower / 1000;
    store = left - drained;
    const flow = drained - taken;
    const loads = Object.fromEntries(
      Object.entries(areasKm2).map(([gauge, area]) => [
        gauge,
        {
          sediment:
            parameters.sediment_factor *
            area *
            (flow / 40) ** parameters.sediment_power *
            (0.2 + arable[place]),
          phosphorus: parameters.phosphorus_factor * area * (flow / 40) * (0.3 + arable[place]),
        },
      ]),
    );
    return { rain: rainMm, pet, et, flow, taken, store, ...loads };
  });
}

/** Reads what a control file names, runs, and writes the outputs. Paths are from `top`. */
export function runModel(top, controlFile, out) {
  const words = (path) =>
    new Map(
      readFileSync(join(top, path), 'utf8')
        .trim()
        .split('\n')
        .map((line) => line.split(/\s+/)),
    );
  const column = (path) =>
    readFileSync(join(top, path), 'utf8')
      .trim()
      .split('\n')
      .slice(1)
      .map((line) => Number(line.split(';')[1].replace(',', '.')));
  const control = words(controlFile);
  const parameters = Object.fromEntries(
    [...words(control.get('parameters'))].map(([name, value]) => [name, Number(value)]),
  );
  const rain = column(control.get('rain'));
  const shares = column(control.get('land_cover'));
  const days = simulate({
    rain,
    takenM3: column(control.get('withdrawals')),
    arable: rain.map((_, place) => shares[Math.floor(place / 12)]),
    parameters,
  });
  mkdirSync(join(top, out), { recursive: true });
  const write = (name, head, cells) => {
    const row = (values) => values.map((value) => value.padStart(11)).join('');
    const lines = days.map((day, place) => {
      const time = `${2000 + Math.floor(place / 12)}${String((place % 12) + 1).padStart(4)}`;
      return time + row(cells(day).map((value) => value.toFixed(4)));
    });
    const title = `monthly loads, release 3.2.1, ${name}`;
    writeFileSync(join(top, out, name), `${[title, `YEAR MON${row(head)}`, ...lines].join('\n')}\n`);
  };
  write('water.txt', ['RAIN_MM', 'PET_MM', 'ET_MM', 'FLOW_MM', 'TAKEN_MM', 'STORE_MM'], (day) => [
    day.rain,
    day.pet,
    day.et,
    day.flow,
    day.taken,
    day.store,
  ]);
  for (const gauge of Object.keys(areasKm2))
    write(`${gauge}.txt`, ['SEDIMENT_T', 'PHOSPH_KG', 'SED_LOW', 'SED_HIGH'], (day) => [
      day[gauge].sediment,
      day[gauge].phosphorus,
      day[gauge].sediment * 0.72,
      day[gauge].sediment * 1.3,
    ]);
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href)
  runModel('.', process.argv[2], process.argv[3]);
