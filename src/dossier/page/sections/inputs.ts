import { missingShares } from '../../../facts/missing-shares.ts';
import { nodesIn } from '../../../facts/nodes-in.ts';
import { seriesFilesOf } from '../../../facts/series-of.ts';
import type { Preparation } from '../../../manifest/data.generated.ts';
import { type RecordNode, sha256Of } from '../../../records/record.ts';
import { figure } from '../../../rules/figures.ts';
import { formatDate } from '../../../series/calendar.ts';
import { barsOverTime } from '../../charts/bars-over-time.ts';
import { type Block, facts, figures, heading, paragraph, type Text, tableOr } from '../document.ts';
import { count, notStated, words } from '../say.ts';
import type { Subject } from '../subject.ts';
import { gapRows } from './gap-rows.ts';

type InputRecord = RecordNode<'inputs'>;

/** Every input: where it came from, its bytes, what its files hold and what they lack. */
export async function inputsSection(subject: Subject): Promise<readonly Block[]> {
  const { key } = subject;
  const inputs = nodesIn(subject.facts.records.nodes, 'inputs');
  const blocks: Block[] = [heading(1, 'Inputs', `${key}-inputs`)];
  if (inputs.length === 0) blocks.push(paragraph('No inputs are recorded.'));
  for (const [place, input] of inputs.entries())
    blocks.push(
      heading(2, input.name ?? input.id, `${key}-input-${place + 1}`),
      ...(await oneInput(input, subject)),
    );
  return blocks;
}

async function oneInput(input: InputRecord, subject: Subject): Promise<readonly Block[]> {
  const { fragment } = input;
  const { source = {}, series = {}, grid } = fragment;
  const from =
    source.url ??
    source.doi ??
    (source.collected_by === undefined ? undefined : `collected by ${source.collected_by}`);
  return [
    ...facts(
      ['Role', words(fragment.role ?? notStated)],
      ['Provider', source.provider ?? notStated],
      [
        'Title',
        [source.title ?? notStated, source.version === undefined ? '' : `, version ${source.version}`].join(
          '',
        ),
      ],
      ['From', from === undefined ? notStated : [{ code: from }]],
      ['Retrieved', `${source.retrieved ?? notStated}; licence ${source.licence ?? notStated}`],
      ['Series', fragment.series === undefined ? null : seriesText(series)],
      [
        'Grid',
        grid === undefined
          ? null
          : `cell ${String(grid.cell ?? '?')} ${grid.unit ?? ''}, ${grid.crs ?? 'no reference system stated'}`,
      ],
      ['Gaps', fragment.gaps_treated],
      ['Below zero', fragment.may_be_negative_because],
      ...(fragment.preparation ?? []).map((step): [string, Text] => ['Preparation', preparationText(step)]),
      ['Note', fragment.note],
    ),
    ...profile(input, subject),
    digests(input),
    ...figures(await gapChart(input, subject)),
  ];
}

function seriesText({
  unit,
  step,
  day_ends,
  utc_offset,
}: NonNullable<InputRecord['fragment']['series']>): string {
  return [
    `unit ${unit ?? notStated}`,
    `step ${step ?? notStated}`,
    day_ends === undefined ? '' : `days end at ${day_ends}`,
    utc_offset === undefined ? '' : `UTC${utc_offset}`,
  ]
    .filter((part) => part !== '')
    .join(', ');
}

function preparationText({ step, because, script, on }: Preparation): Text {
  const scripts = script === undefined ? [] : [script].flat();
  return [
    step ?? notStated,
    because === undefined ? '' : `, because ${because}`,
    on === undefined ? '' : ` (${on})`,
    ...scripts.flatMap((one) => ['; by ', { code: one }]),
  ];
}

/** A row for each column of each file. */
function profile(input: InputRecord, { facts: { profiles, manifest } }: Subject): readonly Block[] {
  const found = profiles.get(input.name ?? '');
  if (found === undefined) return [];
  const shares = missingShares(input, found, manifest).map(
    ({ file, stated, found: counted, agrees }) =>
      `${file ?? 'missing share'}: stated ${stated ?? 'nothing'}, counted ${figure(counted)}${agrees ? '' : ' (differs)'}`,
  );
  const rows = found.files.flatMap((file) =>
    file.columns.map((column) => {
      const steps = column.values + column.missing + column.absent;
      const mean = column.values === 0 ? '-' : figure(column.total / column.values);
      return [
        [{ code: file.name }, ` ${column.name}`],
        file.days === null ? '-' : `${formatDate(file.days.firstDay)} to ${formatDate(file.days.lastDay)}`,
        figure(column.values),
        `${figure(column.missing + column.absent)} (${steps === 0 ? '-' : ((100 * (column.missing + column.absent)) / steps).toFixed(2)} %)`,
        column.lowest === null ? '-' : `${figure(column.lowest.value)} (${column.lowest.time})`,
        mean,
        column.highest === null ? '-' : `${figure(column.highest.value)} (${column.highest.time})`,
      ] as const;
    }),
  );
  return [
    ...(input.fragment.period === undefined
      ? []
      : facts(['Stated period', input.fragment.period.replace('/', ' to ')], ['Missing', shares.join('; ')])),
    tableOr(
      'Its files hold no series that can be read.',
      `What the files of ${input.name} hold${input.fragment.series?.unit === undefined ? '' : `, in ${input.fragment.series.unit}`}`,
      ['File and column', 'Days', 'Values', 'Missing', 'Lowest', 'Mean', 'Highest'],
      rows,
    ),
  ];
}

function digests({ claims, elsewhere, name }: InputRecord): Block {
  const here = [...claims.values()].map(({ path, identity }): readonly Text[] => [
    { code: path },
    identity.kind === 'unavailable'
      ? `not here: ${identity.why.replaceAll('-', ' ')}`
      : `${figure(identity.bytes)} bytes`,
    sha256Of(identity) === null ? 'could not be verified' : { code: sha256Of(identity) ?? '' },
  ]);
  const outside = elsewhere.map(({ path, bytes, sha256, location }): readonly Text[] => [
    [{ code: path }, location === undefined ? '; kept outside git' : `; kept at ${location}`],
    bytes === undefined ? 'size not stated' : `${figure(bytes)} bytes`,
    sha256 === undefined ? 'digest not stated' : { code: sha256 },
  ]);
  return tableOr(
    'It names no files.',
    `Files of ${name}`,
    ['File', 'Size', 'SHA-256'],
    [...here, ...outside],
  );
}

async function gapChart(input: InputRecord, { facts: { records }, content: { snapshot } }: Subject) {
  if (input.fragment.series === undefined) return null;
  const { rows, missing, more } = await gapRows(input, records, snapshot);
  const name = input.name ?? input.id;
  return barsOverTime(rows, {
    title: `${name}: what is there and what is missing`,
    summary: `${missing === 0 ? 'No step is missing between first and last value' : `${figure(missing)} steps are missing in the rows drawn`}${more === 0 ? '' : `; ${more} more columns are not drawn`}.`,
    source: `${input.id} (${count(seriesFilesOf(input).length, 'file')})`,
    legend: [
      { mark: 'bar', shape: 'area', text: 'values' },
      { mark: 'gap', shape: 'area', text: 'gap (taller)' },
    ],
  });
}
