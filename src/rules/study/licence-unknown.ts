import deprecated from 'spdx-license-ids/deprecated.json' with { type: 'json' };
import ids from 'spdx-license-ids/index.json' with { type: 'json' };
import { nearestName } from '../../manifest/nearest.ts';
import { rule } from '../rule.ts';
import { fair } from '../sources.ts';

const known: ReadonlySet<string> = new Set([...ids, ...deprecated]);

export const studyLicenceUnknown = rule({
  id: 'study.licence-unknown',
  scope: 'study',
  from: 'archive',
  means: 'incomplete',
  statement: 'The study’s licence is missing or is no SPDX licence id.',
  why: 'Without a licence nobody may lawfully rerun, adapt or republish the model, and archives ask for the SPDX id.',
  source: fair,
  clear: 'Write `study.licence` as an SPDX id, such as CC-BY-4.0 or MIT (list: spdx.org/licenses).',
  check({ id, fragment: { licence } }) {
    const field = ['study', 'licence'];
    if (licence === undefined) return [{ record: id, field, message: 'The study states no licence.' }];
    const unknown = licence.split(/ (?:AND|OR) /).find((one) => !known.has(one));
    if (unknown === undefined) return [];
    const near = nearestName(unknown, ids);
    return [
      {
        record: id,
        field,
        stated: licence,
        message: `\`${unknown}\` is no SPDX licence id${near === undefined ? '' : `; the nearest is ${near}`}.`,
      },
    ];
  },
});
