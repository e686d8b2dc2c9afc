import { stringify } from 'yaml';
import type { DossierContent } from '../content.ts';
import { dossierIdentifier } from '../identifier.ts';
import known from './cff-licences.json' with { type: 'json' };
import { licencesOf, licenceUrl } from './licence.ts';
import { authorsOfAll, type Party } from './people.ts';
import { descriptionOf, keywordsOf, titleOf, writtenOn } from './telling.ts';

const licencesOfFormat: ReadonlySet<string> = new Set(known.ids.split(' '));

/**
 * `CITATION.cff`, Citation File Format 1.2.0. Authors stand under their whole name: which part of a name is the family's
 * is nowhere recorded, and not the same everywhere.
 */
export function citation(content: DossierContent): string {
  const authors = authorsOfAll(content);
  const whole = {
    'cff-version': '1.2.0',
    message: content.draft
      ? 'This is a draft; please do not cite it.'
      : 'If you use this model study, please cite it as below.',
    type: 'dataset',
    title: titleOf(content),
    abstract: descriptionOf(content),
    authors: authors.length === 0 ? [{ name: 'Unknown' }] : authors.map(author),
    'date-released': writtenOn(content),
    commit: content.commit,
    identifiers: [{ type: 'other', value: `urn:uuid:${dossierIdentifier(content)}` }],
    keywords: keywordsOf(content),
    ...licence(licencesOf(content)),
  };
  return stringify(whole, {
    defaultStringType: 'QUOTE_DOUBLE',
    defaultKeyType: 'PLAIN',
    lineWidth: 0,
    doubleQuotedMinMultiLineLength: Number.MAX_SAFE_INTEGER,
  });
}

function author({ name, email, orcid, url }: Party): object {
  return {
    name,
    ...(email !== undefined && /^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(email) ? { email } : {}),
    ...(orcid === undefined ? {} : { orcid }),
    ...(url === undefined ? {} : { website: url }),
  };
}

/** The format's list of licences is that of May 2021; a list of several means that one may be chosen, so it is not used. */
function licence(names: readonly string[]): object {
  const [name, ...others] = names;
  if (name === undefined || others.length > 0) return {};
  if (licencesOfFormat.has(name)) return { license: name };
  const url = licenceUrl(name);
  return url === null ? {} : { 'license-url': url };
}
