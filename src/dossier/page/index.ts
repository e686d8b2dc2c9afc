import type { DossierContent, DossierFile, DossierStudy } from '../content.ts';
import { documentPath } from '../layout.ts';
import { titleOfStudy } from '../machine/telling.ts';
import type { Block, Page } from './document.ts';
import { balanceSection } from './sections/balance.ts';
import { crosswalkSection } from './sections/crosswalk.ts';
import { findingsSection } from './sections/findings.ts';
import { inputsSection } from './sections/inputs.ts';
import {
  assumptionsSection,
  interventionsSection,
  signedSection,
  uncertaintySection,
} from './sections/judgements.ts';
import { opening } from './sections/opening.ts';
import { outsideSection } from './sections/outside.ts';
import { parametersSection } from './sections/parameters.ts';
import { periodsSection } from './sections/periods.ts';
import { recordsSection } from './sections/records.ts';
import { rerunSection } from './sections/rerun.ts';
import { scenariosSection } from './sections/scenarios.ts';
import { studySection } from './sections/study.ts';
import { targetsSection } from './sections/targets.ts';
import { manyColumns, type Subject } from './subject.ts';
import { toHtml } from './to-html.ts';
import { toMarkdown } from './to-markdown.ts';

/** The dossier for people: one page, as HTML and as Markdown. The same content gives the same bytes. */
export async function pageDocuments(content: DossierContent): Promise<readonly DossierFile[]> {
  const page: Page = {
    title: content.studies.map(titleOfStudy).join('; ') || 'Catchment model',
    draft: content.draft,
    foot: `${content.draft ? 'DRAFT, ' : ''}commit ${content.commit}`,
    blocks: [...opening(content), ...(await studyBlocks(content)), ...(await outsideSection(content))],
  };
  return [
    { path: documentPath('dossier.html'), content: toHtml(page) },
    { path: documentPath('dossier.md'), content: toMarkdown(page) },
  ];
}

async function studyBlocks(content: DossierContent): Promise<readonly Block[]> {
  const targets = content.studies.reduce((sum, { facts }) => sum + facts.scores.size, 0);
  const blocks: Block[] = [];
  for (const [place, study] of content.studies.entries()) {
    const subject = { ...study, content, key: `study-${place + 1}`, columns: columnsFor(targets) };
    const own = await sectionsOf(subject);
    blocks.push(...(content.studies.length > 1 ? named(own, study) : own));
  }
  return blocks;
}

/** Fewer where there are many targets, so that a hundred of them stay below 5 MB. */
function columnsFor(targets: number): number {
  return targets <= 12 ? manyColumns : Math.max(40, Math.min(170, Math.round(10_000 / targets)));
}

async function sectionsOf(subject: Subject): Promise<readonly Block[]> {
  return [
    ...studySection(subject),
    ...recordsSection(subject),
    ...findingsSection(subject),
    ...(await inputsSection(subject)),
    ...periodsSection(subject),
    ...(await targetsSection(subject)),
    ...parametersSection(subject),
    ...balanceSection(subject),
    ...scenariosSection(subject),
    ...assumptionsSection(subject),
    ...interventionsSection(subject),
    ...uncertaintySection(subject),
    ...signedSection(subject),
    ...crosswalkSection(subject),
    ...rerunSection(subject),
  ];
}

/** With several studies each section says whose it is. */
function named(blocks: readonly Block[], study: DossierStudy): readonly Block[] {
  return blocks.map((block) =>
    block.kind === 'heading' && block.level === 1
      ? { ...block, text: `${titleOfStudy(study)}: ${block.text}` }
      : block,
  );
}
