import type { DossierContent, DossierStudy } from '../content.ts';

/** The title of a dossier, the same in every document. */
export function titleOf(content: DossierContent): string {
  const title = content.studies.map(titleOfStudy).join('; ');
  return content.draft ? `DRAFT: ${title}` : title;
}

export function titleOfStudy({ facts, verdict }: DossierStudy): string {
  const { study, catchment } = facts.manifest.data;
  const named = [study?.title, study?.id, catchment?.name].map((text) => oneLine(text ?? ''));
  return named.find((text) => text !== '') ?? `Catchment model in ${oneLine(verdict.path)}`;
}

/** A text without line breaks and control characters, which some archives' formats can't hold. */
export function oneLine(text: string): string {
  return text.replace(/[\s\p{Cc}]+/gu, ' ').trim();
}

/** What the studies are for, and what state their records are in. */
export function descriptionOf({ studies, commit, draft, verdict }: DossierContent): string {
  const purposes = studies.flatMap(({ facts }) => {
    const { purpose, decision } = facts.manifest.data.study ?? {};
    return [purpose, decision].flatMap((text) => (text === undefined ? [] : oneLine(text)));
  });
  const { records, sound } = verdict.totals;
  return [
    ...purposes,
    `Records, data and results of a catchment model at commit ${commit}: ${sound} of ${records} records sound.`,
    ...(draft ? ['This is a draft: required records are missing, stale or contradicted.'] : []),
  ].join(' ');
}

export function keywordsOf({ studies }: DossierContent): readonly string[] {
  const variables = studies.flatMap(({ facts }) =>
    (facts.manifest.data.study?.needs ?? []).flatMap(({ variable }) => variable?.replace('_', ' ') ?? []),
  );
  return [...new Set(['hydrology', 'catchment model', ...variables.filter((name) => name !== 'other')])];
}

/** The day of the commit. */
export function writtenOn({ committedAt }: DossierContent): string {
  return committedAt.slice(0, 10);
}
