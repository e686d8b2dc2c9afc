import type { CaseFigures, DriverFigures } from '../../../facts/conditions.ts';
import { nodesIn } from '../../../facts/nodes-in.ts';
import { isDefined } from '../../../hydrology/paired.ts';
import type { RecordNode } from '../../../records/record.ts';
import { figure } from '../../../rules/figures.ts';
import { driverRanges } from '../../charts/driver-ranges.ts';
import { type Block, facts, figures, heading, paragraph, type Text, tableOr } from '../document.ts';
import { capital, figureOr, notStated, words } from '../say.ts';
import type { Subject } from '../subject.ts';

/** What each scenario asks, and how far its drivers reach beyond the calibrated conditions. */
export function scenariosSection(subject: Subject): readonly Block[] {
  const { facts: computed, key } = subject;
  const { scenarios } = computed.manifest.data;
  const cases = nodesIn(computed.records.nodes, 'scenarios');
  const conditions = [...computed.scenarios.conditions].map(([name, { figures: found }]): readonly Text[] => [
    capital(words(name)),
    ...(isDefined(found)
      ? [
          figure(found.value.mean),
          figure(found.value.lowest),
          figure(found.value.highest),
          `${found.value.values.length}`,
        ]
      : [`none: ${found.undefined}`, '-', '-', '-']),
    unitOf(name, subject),
  ]);
  return [
    heading(1, 'Scenarios', `${key}-scenarios`),
    ...(cases.length === 0 ? [paragraph(scenarios?.none_because ?? 'No scenarios are recorded.')] : []),
    ...(conditions.length === 0
      ? []
      : [
          tableOr(
            '',
            'Calibrated conditions',
            ['Condition', 'Mean', 'Lowest', 'Highest', 'Values', 'Unit'],
            conditions,
          ),
        ]),
    ...cases.flatMap((one, place) => [
      heading(2, one.name ?? one.id, `${key}-scenario-${place + 1}`),
      ...oneCase(one, computed.scenarios.cases.get(one.id), subject),
    ]),
  ];
}

function unitOf(name: string, { facts: computed }: Subject): string {
  return computed.manifest.data.scenarios?.conditions?.[name]?.unit ?? '';
}

function oneCase(
  node: RecordNode<'scenarios'>,
  found: CaseFigures | undefined,
  subject: Subject,
): readonly Block[] {
  const { fragment } = node;
  const changed = fragment.parameters_changed;
  const drivers = [...(found?.drivers ?? [])];
  const rows = drivers.map(([name, { figures: own, reach }]): readonly Text[] => [
    capital(words(name)),
    isDefined(own) ? `${figure(own.value.mean)} ${unitOf(name, subject)}` : `none: ${own.undefined}`,
    isDefined(reach) ? figureOr(reach.value.changePercent, '%') : '-',
    isDefined(reach) ? (reach.value.mean === null ? 'inside' : { strong: 'outside' }) : '-',
    isDefined(reach) && isDefined(own) ? `${reach.value.outside.length} of ${own.value.values.length}` : '-',
  ]);
  return [
    ...facts(
      ['Asks', fragment.asks ?? notStated],
      ['Run', [{ code: `runs.${fragment.run ?? notStated}` }]],
      [
        'Parameters changed',
        changed === undefined
          ? null
          : `${(changed.names ?? []).join(', ')}, because ${changed.because ?? notStated}`,
      ],
      ['Note', fragment.note],
    ),
    tableOr(
      'It names no drivers.',
      `Drivers of ${node.name} against the calibrated conditions`,
      ['Driver', 'Mean', 'Change of the mean', 'Mean in the calibrated range', 'Values outside'],
      rows,
    ),
    ...figures(...drivers.map(([name, driver]) => onRange(name, node, driver, subject))),
  ];
}

function onRange(
  name: string,
  node: RecordNode<'scenarios'>,
  { figures: own }: DriverFigures,
  subject: Subject,
) {
  const calibrated = subject.facts.scenarios.conditions.get(name)?.figures;
  if (calibrated === undefined || !isDefined(calibrated) || !isDefined(own)) return null;
  return driverRanges(
    { calibrated: calibrated.value, scenario: own.value },
    {
      title: `${node.name}: ${words(name)} against calibration`,
      quantity: `${capital(words(name))}, ${unitOf(name, subject)}`,
      source: `scenarios.conditions.${name} and ${node.id}`,
    },
  );
}
