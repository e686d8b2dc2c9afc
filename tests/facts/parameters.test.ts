import { expect, it } from 'vitest';
import { studyFacts } from '../harness/study.ts';

const table = 'calibration/parameters.csv';
const own = 'data/interception.csv';

it('reads a row of a table as the manifest would state it, and names it by layer and scope where a name repeats', async () => {
  const columns =
    'name,unit,calibrated,change,initial,by,value,range_low,range_high,range_of,range_from,search,scope,layer,handbook_table,handbook_class,soil_group,impervious_share';
  const rows = [
    'ksat,mm/h,true,scale,8,1.5,12.0,0.1,10,factor,report 3,log,valley,2,saturated-conductivity,loam,,',
    'ksat,mm/h,false,,,,3,,,,,,,1,,,,',
    'cn2,1,false,,,,78,,,,,,town,,curve-number,"open space, good",B,0.2',
  ];
  const { parameters } = await studyFacts({
    set: { 'parameters.table': table },
    remove: ['parameters.values'],
    files: { [table]: `${[columns, ...rows].join('\n')}\n` },
  });
  expect(parameters.unread).toEqual([]);
  expect(parameters.values).toEqual([
    {
      parameter: {
        name: 'ksat',
        unit: 'mm/h',
        calibrated: true,
        change: 'scale',
        initial: 8,
        by: 1.5,
        value: 12,
        range: [0.1, 10],
        range_of: 'factor',
        range_from: 'report 3',
        search: 'log',
        scope: 'valley',
        layer: '2',
        handbook: { table: 'saturated-conductivity', class: 'loam' },
      },
      label: 'ksat (valley, layer 2)',
      field: ['parameters', 'table'],
      at: { file: table, line: 2 },
      written: '12.0',
    },
    {
      parameter: { name: 'ksat', unit: 'mm/h', calibrated: false, value: 3, layer: '1' },
      label: 'ksat (layer 1)',
      field: ['parameters', 'table'],
      at: { file: table, line: 3 },
      written: '3',
    },
    {
      parameter: {
        name: 'cn2',
        unit: '1',
        calibrated: false,
        value: 78,
        scope: 'town',
        handbook: {
          table: 'curve-number',
          class: 'open space, good',
          soil_group: 'B',
          impervious_share: 0.2,
        },
      },
      label: 'cn2',
      field: ['parameters', 'table'],
      at: { file: table, line: 4 },
      written: '78',
    },
  ]);
});

it('rests on its table, on the tables of the project’s own and on the model’s file', async () => {
  const { records } = await studyFacts({
    set: {
      'parameters.table': table,
      'parameters.model_file': { file: 'model/parameters.txt', separator: 'blank' },
      'parameters.handbook_tables': { interception: { table: own, source: 'report 5' } },
    },
    files: { [table]: 'name\nksat\n', [own]: 'class,low,high\nheather,0.1,0.5\n' },
  });
  expect([...(records.nodes.get('parameters')?.claims.keys() ?? [])]).toEqual(
    expect.arrayContaining([table, own, 'model/parameters.txt']),
  );
});
