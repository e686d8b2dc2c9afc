import deprecated from 'spdx-license-ids/deprecated.json' with { type: 'json' };
import ids from 'spdx-license-ids/index.json' with { type: 'json' };
import type { DossierContent } from '../content.ts';

const known: ReadonlySet<string> = new Set([...ids, ...deprecated]);

/** Where the text of a licence stands; null where its name is no SPDX id. */
export function licenceUrl(name: string): string | null {
  return known.has(name) ? `https://spdx.org/licenses/${name}.html` : null;
}

/** The licences of the studies, none twice, in their order. */
export function licencesOf({ studies }: DossierContent): readonly string[] {
  return [...new Set(studies.flatMap(({ facts }) => facts.manifest.data.study?.licence ?? []))];
}
