/** A small invented study with every kind of record; figures and files mean nothing. */
export const smallStudy = `stoplog: 1
study: {id: low-flow, purpose: Low flow at the mill, phase: validation}
catchment: {name: Upper Mill, area: {value: 12, unit: km2}}
model:
  name: two-store
  version: "1.4"
  executable: [model/run.mjs]
  justification: It fits the question.
inputs:
  rainfall: {role: precipitation, files: [data/rain/*.csv], preparation: [{step: gaps, because: two outages, script: data/prepare.mjs}], compare_with: {input: check}}
  check: {role: precipitation, files: [data/check.csv]}
  flow: {role: streamflow, files: [data/flow.csv]}
  future: {role: precipitation, files: [data/future.csv]}
  radar: {role: precipitation, stored: elsewhere, files: [{path: radar.nc, sha256: ${'a'.repeat(64)}, bytes: 9, location: tape 4}]}
periods:
  year_begins: 10-01
  simulation: 2001-10-01/2009-09-30
  warm_up: 2001-10-01/2003-09-30
  calibration: [2003-10-01/2006-09-30]
  validation: [2006-10-01/2009-09-30]
setup: {choices: [{topic: routing, chosen: linear store, because: short travel time}]}
readings:
  - {of: periods.warm_up, as: years, file: model/control.txt, take: {key: warmup}}
parameters:
  calibrated_by: {algorithm: search, on: [rainfall, flow]}
  values: [{name: capacity, unit: mm, value: 180, note: deep soils}]
  sensitivity: {file: calibration/sensitivity.csv}
runs:
  calibrated:
    start: [node, model/run.mjs]
    takes: [inputs.rainfall, parameters, model/control.txt]
    gives: [runs/calibrated/*.csv]
    stores: {file: runs/calibrated/daily.csv, values: [soil]}
  dry: {takes: [inputs.future, parameters], gives: [runs/dry/*.csv]}
evaluation:
  outlet:
    observed: {input: flow}
    simulated: {run: calibrated, file: runs/calibrated/daily.csv}
    scores: {calibration: {nse: 0.8}, validation: {nse: 0.7}}
    accepts: [{rule: evaluation.score-low, because: short record, by: A. Weir, on: 2026-02-01}]
balance:
  catchment: {run: calibrated, file: runs/calibrated/daily.csv}
interventions:
  - {kind: reservoir, name: upper, represented: true, settings: model/reservoir.txt}
  - {kind: irrigation, represented: false, settings: model/unused.txt, because: under one percent}
seasons:
  - {variable: leaf_area, simulated: {run: calibrated, file: runs/calibrated/daily.csv}, observed: {input: check}}
uncertainty:
  bands: {outlet: {file: bands/outlet.csv, over: validation}}
scenarios:
  conditions:
    rain: {input: rainfall, by: year}
    pet: {run: calibrated, file: runs/calibrated/daily.csv}
  cases:
    dry: {run: dry, drivers: {rain: {input: future}, pet: {run: dry, file: runs/dry/daily.csv}}}
covers: ["**"]
leaves_out: ["**/README.md"]
`;

export const smallFiles: Readonly<Record<string, string>> = {
  'model/run.mjs': '// run',
  'model/control.txt': 'warmup 2',
  'model/reservoir.txt': 'release 3',
  'model/unused.txt': 'none',
  'data/rain/high.csv': 'rain 1',
  'data/rain/low.csv': 'rain 2',
  'data/prepare.mjs': '// prepare',
  'data/check.csv': 'check',
  'data/flow.csv': 'flow',
  'data/future.csv': 'future',
  'data/README.md': 'about the data',
  'calibration/sensitivity.csv': 'sensitivity',
  'runs/calibrated/daily.csv': 'daily',
  'runs/dry/daily.csv': 'dry daily',
  'bands/outlet.csv': 'band',
};
