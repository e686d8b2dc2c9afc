// Makes the radar composite that stoplog.yaml says is kept elsewhere, so that its digest can be verified:
//
//   node data/make-radar.mjs          writes radar/2001-2015.csv, which git ignores
import { mkdirSync } from 'node:fs';
import { seededRandom } from '../calibration/random.mjs';
import { round, writeTable } from '../model/table.mjs';
import { dates, trueWeather } from './make-invented-data.mjs';
import { unseen } from './make-invented-flow.mjs';

process.chdir(`${import.meta.dirname}/..`);
mkdirSync('radar', { recursive: true });
const { normal } = seededRandom(411);
// Radar sees the storms that fell between the gauges, and misjudges every day's depth.
const seen = trueWeather().rain.map((depth, day) => depth + (unseen[dates[day]] ?? 0));
const rain = seen.map((depth) => round(depth * 0.91 * Math.max(0.1, 1 + 0.4 * normal()), 2));
writeTable('radar/2001-2015.csv', { date: dates, rain_mm: rain });
