// Redoes everything: the invented data, their preparation, the calibration, the runs and the band. It takes
// some ten seconds, and gives the same bytes every time and everywhere. See README.md.
import { execFileSync } from 'node:child_process';
import { makeBand } from './calibration/band.mjs';
import { calibrate } from './calibration/calibrate.mjs';
import { makeScenario } from './data/dry-2050.mjs';
import { makeData } from './data/make-invented-data.mjs';
import { makeFlow } from './data/make-invented-flow.mjs';
import { prepare } from './data/prepare.mjs';

process.chdir(import.meta.dirname);

makeData();
makeFlow();
prepare();
makeScenario();
calibrate();
runModel('model/control.txt', 'runs/calibrated');
runModel('model/control-dry-years.txt', 'runs/dry-years');
runModel('model/control-dry.txt', 'runs/dry-2050');
makeBand();
await import('./calibration/figures.mjs');

function runModel(control, folder) {
  execFileSync(process.execPath, ['model/two-store.mjs', '--control', control, '--out', folder]);
}
