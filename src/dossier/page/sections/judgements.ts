import { isDefined, type Statistic } from '../../../hydrology/paired.ts';
import type { Acceptance, ManifestData, UncertaintySource } from '../../../manifest/data.generated.ts';
import { asPrinted } from '../../../rules/evaluation/score-names.ts';
import { figure } from '../../../rules/figures.ts';
import { type Block, heading, paragraph, type Text, tableOr } from '../document.ts';
import { besideStated, capital, notStated, words, yesOrNo } from '../say.ts';
import type { Subject } from '../subject.ts';

/** What people assumed, chose, did to the water and know of their uncertainty. */
export function assumptionsSection({ facts: computed, key }: Subject): readonly Block[] {
  const { model, setup, study } = computed.manifest.data;
  const literature = study?.literature;
  return [
    heading(1, 'Assumptions and set-up', `${key}-assumptions`),
    tableOr(
      'No alternative model is recorded.',
      'Alternatives weighed',
      ['Alternative', 'Rejected because'],
      (model?.alternatives ?? []).map(({ name, rejected_because }) => [
        name ?? notStated,
        rejected_because ?? notStated,
      ]),
    ),
    tableOr(
      'No assumptions are recorded.',
      'Assumptions',
      ['Assumption', 'Holds', 'Evidence or response'],
      (model?.assumptions ?? []).map(({ states, holds, evidence, response }) => [
        states ?? notStated,
        yesOrNo(holds),
        response ?? evidence ?? '-',
      ]),
    ),
    tableOr(
      'No choices of the set-up are recorded.',
      'Choices of the set-up',
      ['Topic', 'Chosen', 'Because', 'Default'],
      (setup?.choices ?? []).map(({ topic, chosen, because, default: isDefault, thresholds }) => [
        topic ?? notStated,
        [
          chosen ?? notStated,
          ...Object.entries(thresholds ?? {}).map(([name, value]) => `; ${name} ${value}`),
        ].join(''),
        because ?? notStated,
        isDefault === true ? 'yes' : 'no',
      ]),
    ),
    Array.isArray(literature)
      ? tableOr(
          'No earlier work is listed.',
          'Earlier work',
          ['Work', 'Gives'],
          literature.map(({ cites, gives, doi }) => [
            [cites, doi].filter((part) => part !== undefined).join(', '),
            gives ?? '-',
          ]),
        )
      : paragraph(
          literature === undefined
            ? 'No earlier work is listed.'
            : `No earlier work was found in ${(literature.none_found.sought_in ?? []).join(', ')} (${literature.none_found.on ?? notStated}).`,
        ),
    ...readings(computed.readings),
  ];
}

function readings(taken: Subject['facts']['readings']): readonly Block[] {
  const rows = taken.map(({ name, file, line, stated, found, agrees, problem }): readonly Text[] => [
    { code: name },
    stated === null ? '-' : String(stated),
    found === null ? (problem ?? '-') : String(found),
    agrees ? 'yes' : { strong: 'no' },
    [{ code: file }, line === null ? '' : ` line ${line}`],
  ]);
  return rows.length === 0
    ? []
    : [tableOr('', 'What the model’s own files say', ['Field', 'Stated', 'Found', 'Agree', 'Where'], rows)];
}

export function interventionsSection({ facts: computed, key }: Subject): readonly Block[] {
  const { interventions } = computed.manifest.data;
  const list = Array.isArray(interventions) ? interventions : [];
  const none =
    interventions !== undefined && 'none_because' in interventions
      ? `None, because ${interventions.none_because}`
      : 'Nothing is said about interventions.';
  return [
    heading(1, 'Interventions', `${key}-interventions`),
    tableOr(
      none,
      'What people do to the catchment’s water',
      ['Which', 'Represented', 'How, or why not', 'Settings'],
      list.map(({ kind, name, represented, how, because, settings, default: isDefault }): readonly Text[] => [
        [kind, name].filter((part) => part !== undefined).join(': '),
        yesOrNo(represented),
        [how, because].filter((part) => part !== undefined).join('; ') || notStated,
        settings === undefined
          ? '-'
          : [{ code: [settings].flat().join(', ') }, isDefault === true ? ' (default)' : ''],
      ]),
    ),
  ];
}

const sources = ['observations', 'inputs', 'parameters', 'structure'] as const;

export function uncertaintySection({ facts: computed, key }: Subject): readonly Block[] {
  const stated = computed.manifest.data.uncertainty?.sources ?? {};
  const bands = computed.bands.map(
    ({ target, over, fragment, recomputed, stated: said }): readonly Text[] => {
      const found =
        isDefined(recomputed) && isDefined(recomputed.value.stated) ? recomputed.value.stated.value : null;
      const saying = (name: string, file: Statistic) => {
        const printed = said.find((one) => one.name === name)?.printed;
        return `${printed === undefined ? notStated : asPrinted(printed)}; from the files ${besideStated(printed, file)}`;
      };
      const none = { undefined: 'not computed' };
      return [
        { code: target },
        over,
        fragment.level === undefined ? notStated : figure(fragment.level),
        saying('coverage', found?.coverage ?? none),
        saying('relative_width', found?.relativeWidth ?? none),
      ];
    },
  );
  return [
    heading(1, 'Uncertainty', `${key}-uncertainty`),
    tableOr(
      '',
      'Sources of uncertainty',
      ['Source', 'What was done'],
      sources.map((name) => [capital(name), treatment(stated[name])]),
    ),
    tableOr(
      'No uncertainty band is recorded.',
      'Bands',
      ['Target', 'Over', 'Level', 'Share of observations inside', 'Width over the observed deviation'],
      bands,
    ),
  ];
}

function treatment(source: UncertaintySource | undefined): string {
  if (source?.treated !== undefined) return source.treated;
  return source?.left_out_because === undefined
    ? 'not addressed'
    : `left out, because ${source.left_out_because}`;
}

/** Everything that passes by somebody's signed word, or by other limits than usual. */
export function signedSection({ facts: computed, verdict, key }: Subject): readonly Block[] {
  const { waivers = [] }: ManifestData = computed.manifest.data;
  const accepted = [...computed.records.nodes.values()].flatMap(({ id, fragment }) => {
    const { accepts = [] } = fragment as { accepts?: readonly Acceptance[] };
    return accepts.map((one, place): readonly Text[] => [
      { code: id },
      [one.rule, ...(one.driver === undefined ? [] : [` (${words(one.driver)})`])].join(''),
      one.because ?? notStated,
      `${one.by ?? notStated}, ${one.on ?? notStated}`,
      computed.standings.get(id)?.fallen.includes(place) === true
        ? { strong: 'no: the record changed since' }
        : 'yes',
    ]);
  });
  return [
    heading(1, 'Waivers, acceptances and departures', `${key}-signed`),
    tableOr(
      'No waivers.',
      'Waivers: permission to pass with a finding until a date',
      ['Rule', 'Record', 'Because', 'By', 'Until'],
      waivers.map(({ rule, record, because, by, until }) => [
        rule,
        record ?? 'all',
        because ?? notStated,
        by ?? notStated,
        until ?? notStated,
      ]),
    ),
    tableOr(
      'No acceptances.',
      'Acceptances: findings that a named person answers for',
      ['Record', 'Finding', 'Because', 'By', 'In force'],
      accepted,
    ),
    tableOr(
      'No departures from the usual levels and limits.',
      'Departures from the usual levels and limits',
      ['Of', 'Now', 'Because', 'Asks for less than usual'],
      verdict.departures.map(({ of, now, because, loosens }) => [
        of,
        now,
        because,
        loosens ? { strong: 'yes' } : 'no',
      ]),
    ),
  ];
}
