import { caution } from '../../../reports/caution.ts';
import { isStated } from '../../../rules/stand-in.ts';
import type { DossierContent, DossierStudy } from '../../content.ts';
import { titleOfStudy } from '../../machine/telling.ts';
import { type Block, facts, type Text } from '../document.ts';
import { count, notStated } from '../say.ts';

/** The first screen: what this is, what was modelled, whether the records hold, and the caution. */
export function opening(content: DossierContent): readonly Block[] {
  const { studies, draft, verdict, commit, committedAt, madeBy } = content;
  const unread = verdict.manifests.filter(({ path }) =>
    studies.every((study) => study.verdict.path !== path),
  );
  return [
    {
      kind: 'paragraph',
      text: 'Where the results of this catchment model come from, whether the records of it still agree with its files, and how to check and rerun them.',
    },
    ...(draft
      ? [
          {
            kind: 'paragraph' as const,
            tone: 'draft' as const,
            text: 'DRAFT: required records are missing, stale or contradicted. Not for archiving.',
          },
        ]
      : []),
    ...studies.flatMap((study) => modelled(study, studies.length > 1)),
    ...studies.map((study) => holding(study, studies.length > 1)),
    ...unread.map(
      ({ path, findings }): Block => ({
        kind: 'paragraph',
        tone: 'bad',
        text: [
          'The manifest ',
          { code: path },
          ` could not be read (${count(findings.length, 'fault')}); nothing of it is shown here.`,
        ],
      }),
    ),
    { kind: 'paragraph', tone: 'caution', text: [{ strong: 'Caution.' }, ` ${caution}`] },
    ...facts(['Commit', [{ code: commit }, ` of ${committedAt}`]], ['Written by', `Stoplog ${madeBy}`]),
  ];
}

function modelled({ facts: { manifest } }: DossierStudy, several: boolean): readonly Block[] {
  const { study = {}, catchment = {}, model = {} } = manifest.data;
  const area = catchment.area === undefined ? '' : `, ${catchment.area.value} ${catchment.area.unit}`;
  return facts(
    ...(several ? [['Study', study.title ?? manifest.path] as const] : []),
    ['Purpose', stated(study.purpose)],
    ['Catchment', catchment.name === undefined ? notStated : `${catchment.name}${area}`],
    [
      'Model',
      model.name === undefined
        ? notStated
        : `${model.name} ${model.release ?? model.version ?? '(no release stated)'}`,
    ],
  );
}

function stated(text: string | undefined): string {
  return isStated(text) ? (text ?? notStated) : notStated;
}

function holding(study: DossierStudy, several: boolean): Block {
  const { records, findings } = study.verdict;
  const sound = records.filter(({ state }) => state === 'sound').length;
  const blocking = findings.filter(
    ({ level, waived, accepted }) => level === 'block' && waived === null && accepted === null,
  );
  const answered = findings.filter(({ waived, accepted }) => waived !== null || accepted !== null);
  const unsound = (['contradicted', 'stale', 'missing', 'incomplete', 'unsealed'] as const).flatMap((one) => {
    const number = records.filter(({ state }) => state === one).length;
    return number === 0 ? [] : `${number} ${one}`;
  });
  const isGood = blocking.length === 0 && unsound.length === 0;
  const whose = several ? ` of ${titleOfStudy(study)}` : '';
  const text: Text = [
    { strong: headline(whose, blocking.length, isGood, study.verdict.phase) },
    ` ${sound} of ${count(records.length, 'record')} ${sound === 1 ? 'is' : 'are'} sound: sealed by a named person and in agreement with the files now${unsound.length === 0 ? '' : `; ${unsound.join(', ')}`}. `,
    `${count(blocking.length, 'finding')} to clear`,
    answered.length === 0 ? '.' : `; ${count(answered.length, 'finding')} passed by somebody’s signed word.`,
  ];
  return { kind: 'paragraph', tone: isGood ? 'good' : 'bad', text };
}

/** A young study may be let pass with records that are missing or stale; that is no reason to say that they hold. */
function headline(whose: string, blocking: number, isGood: boolean, phase: string): string {
  if (isGood) return `The records${whose} hold.`;
  return blocking > 0
    ? `The records${whose} do not hold.`
    : `Not all records${whose} hold, though nothing blocks in phase ${phase}.`;
}
