import type { StatedParameter } from '../../../facts/parameters/stated.ts';
import { isDefined } from '../../../hydrology/paired.ts';
import { boundPosition } from '../../../hydrology/parameters/bound-position.ts';
import type { ParameterValue } from '../../../manifest/data.generated.ts';
import { figure } from '../../../rules/figures.ts';
import { rangeStrip } from '../../charts/range-strip.ts';
import { type Block, facts, heading, paragraph, type Text, tableOr } from '../document.ts';
import { notStated } from '../say.ts';
import type { Subject } from '../subject.ts';

/** The parameters with their ranges, and how they were found. */
export function parametersSection({ facts: computed, key }: Subject): readonly Block[] {
  const { parameters } = computed.manifest.data;
  const by = parameters?.calibrated_by;
  const sensitivity = parameters?.sensitivity;
  return [
    heading(1, 'Parameters', `${key}-parameters`),
    ...(parameters === undefined ? [paragraph('No parameters are recorded.')] : []),
    ...facts(
      [
        'Calibration',
        by === undefined ? null : [by.strategy, by.algorithm].filter((part) => part !== undefined).join(': '),
      ],
      ['Objective', by?.objective],
      ['Model runs', by?.evaluations === undefined ? null : figure(by.evaluations)],
      ['Seed', by?.seed === undefined ? null : String(by.seed)],
      ['Calibrated on', by?.on?.join(', ')],
      [
        'Sensitivity',
        sensitivity === undefined
          ? null
          : (sensitivity.method ?? `none, because ${sensitivity.none_because ?? notStated}`),
      ],
      ['Orders', (parameters?.orders ?? []).map(({ states }) => states ?? '').join(' ')],
      ['Note', parameters?.note],
    ),
    tableOr(
      'No parameter values are stated.',
      'Parameters; in the strip a bar stands where calibration began, a lozenge where it ended',
      ['Parameter', 'Value', 'Initial', 'Change', 'Range', 'Place in its range', 'Range from', 'Scope'],
      computed.parameters.values.map(row),
    ),
  ];
}

function row({ parameter, label, written }: StatedParameter): readonly Text[] {
  const { unit, initial, change, by, range, range_of, range_from, scope, calibrated } = parameter;
  const changed = change === undefined ? '-' : `${change}${by === undefined ? '' : ` by ${figure(by)}`}`;
  return [
    { code: label },
    `${written ?? notStated}${unit === undefined || unit === '1' ? '' : ` ${unit}`}`,
    initial === undefined ? '-' : figure(initial),
    calibrated === false ? 'not calibrated' : changed,
    range === undefined
      ? notStated
      : `${figure(range[0])} to ${figure(range[1])}${range_of === 'factor' ? ' (of the change)' : ''}`,
    strip(parameter),
    range_from ?? '-',
    scope ?? '-',
  ];
}

function strip({ value, by, initial, range, range_of, search, change }: ParameterValue): Text {
  const held = range_of === 'factor' ? by : value;
  const began = range_of === 'factor' ? (change === 'scale' ? 1 : 0) : initial;
  if (range === undefined || held === undefined) return '-';
  const [lower, upper] = range;
  const placed = (at: number) =>
    boundPosition({ value: at, lower, upper, tolerance: 0.01, logarithmic: search === 'log' });
  const here = placed(held);
  if (!isDefined(here)) return here.undefined;
  const before = began === undefined ? null : placed(began);
  return rangeStrip({
    lower,
    upper,
    position: here.value.position,
    began: before !== null && isDefined(before) ? before.value.position : null,
  });
}
