import { jsonReport, jsonText } from '../../reports/json.ts';
import type { DossierContent, DossierFile } from '../content.ts';
import { documentPath } from '../layout.ts';
import { citation } from './citation.ts';
import { crosswalksOf } from './crosswalk.ts';
import { deposit } from './deposit.ts';
import { factsDocument } from './facts-document.ts';
import { provenance } from './provenance/provenance.ts';

export { crateDocument } from './crate/crate.ts';

/** The documents for programs that every dossier holds; that of a crate is made for a bag, when all others are known. */
export function machineDocuments(content: DossierContent): readonly DossierFile[] {
  const documents: Readonly<Record<string, string>> = {
    'CITATION.cff': citation(content),
    'crosswalk.json': jsonText(crosswalkDocument(content)),
    'datacite.json': jsonText(deposit(content)),
    'facts.json': jsonText(factsDocument(content)),
    'findings.json': jsonReport(content.verdict),
    'prov.json': jsonText(provenance(content)),
  };
  return Object.entries(documents).map(([name, text]) => ({ path: documentPath(name), content: text }));
}

function crosswalkDocument({ commit, studies }: DossierContent): object {
  return {
    format: 'stoplog-crosswalk/1',
    commit,
    studies: studies.map((study) => ({
      manifest: study.facts.manifest.path,
      frameworks: crosswalksOf(study),
    })),
  };
}
