import { nodesIn } from '../../../facts/nodes-in.ts';
import { windowSets } from '../../../facts/windows.ts';
import { dayNumber } from '../../../manifest/period.ts';
import { parseWindow } from '../../../series/calendar.ts';
import { type BarRow, barsOverTime, type Stretch } from '../../charts/bars-over-time.ts';
import { type Block, facts, figures, heading, paragraph, type Text, tableOr } from '../document.ts';
import { notStated } from '../say.ts';
import type { Subject } from '../subject.ts';

/** Rows of inputs beside the windows; more make the picture no clearer. */
const mostInputs = 20;

/** Simulation, warm-up, calibration and validation, over what the data cover. */
export function periodsSection(subject: Subject): readonly Block[] {
  const { facts: computed, key } = subject;
  const { periods } = computed.manifest.data;
  const warmUp = periods?.warm_up;
  const sets = windowSets(computed.records);
  const own = sets
    .slice(1)
    .flatMap(({ record, windows }) =>
      windows.map(({ kind, period: { first, last } }): readonly Text[] => [
        { code: record },
        kind,
        `${first} to ${last}`,
      ]),
    );
  return [
    heading(1, 'Periods', `${key}-periods`),
    ...(periods === undefined ? [paragraph('No periods are recorded.')] : []),
    ...facts(
      ['Simulation', said(periods?.simulation)],
      ['Warm-up', typeof warmUp === 'object' ? `none, because ${warmUp.zero_because}` : said(warmUp)],
      ['Calibration', (periods?.calibration ?? []).map(said).join(', ') || notStated],
      ['Validation', (periods?.validation ?? []).map(said).join(', ') || notStated],
      ['Years begin on', periods?.year_begins],
    ),
    ...figures(timeLine(subject)),
    ...(own.length === 0
      ? []
      : [tableOr('', 'Windows of targets of their own', ['Record', 'Window', 'Days'], own)]),
  ];
}

function said(period: string | undefined): string {
  return period?.replace('/', ' to ') ?? notStated;
}

function timeLine({ facts: { records, profiles, manifest } }: Subject) {
  const { periods } = manifest.data;
  const [study] = windowSets(records);
  const ofKind = (kind: string) =>
    (study?.windows ?? [])
      .filter((window) => window.kind === kind)
      .map(({ period }): Stretch => ({ from: dayNumber(period.first), to: dayNumber(period.last) + 1 }));
  const simulations = nodesIn(records.nodes, 'runs').filter(
    ({ fragment }) => fragment.simulation !== undefined,
  );
  const inputs = [...profiles].flatMap(([name, { days }]) =>
    days === null ? [] : [bar(`data: ${name}`, 'bar pale', [{ from: days.firstDay, to: days.lastDay + 1 }])],
  );
  const rows: readonly BarRow[] = [
    bar('simulation', 'bar hollow', stretchesOf(periods?.simulation)),
    bar('warm-up', 'bar second', ofKind('warm-up')),
    bar('calibration', 'bar', ofKind('calibration')),
    bar('validation', 'bar', ofKind('validation')),
    ...simulations.map(({ id, fragment }) =>
      bar(`simulation of ${id}`, 'bar hollow', stretchesOf(fragment.simulation)),
    ),
    ...inputs.slice(0, mostInputs),
  ].filter(({ stretches }) => stretches.length > 0);
  const more = inputs.length - mostInputs;
  return barsOverTime(rows, {
    title: 'Windows over what the data cover',
    summary: `${rows.length} rows: the stated windows above, the days that the data cover below${more > 0 ? `; ${more} more inputs are not drawn` : ''}.`,
    source: `periods and inputs of ${manifest.path}`,
    legend: [
      { mark: 'bar hollow', shape: 'area', text: 'simulation' },
      { mark: 'bar', shape: 'area', text: 'window' },
      { mark: 'bar second', shape: 'area', text: 'warm-up' },
      { mark: 'bar pale', shape: 'area', text: 'data' },
    ],
  });
}

function bar(name: string, mark: string, stretches: readonly Stretch[]): BarRow {
  return { name, mark, stretches, gaps: [] };
}

function stretchesOf(period: string | undefined): readonly Stretch[] {
  const window = parseWindow(period ?? '');
  return window === null ? [] : [{ from: window.firstDay, to: window.lastDay + 1 }];
}
