import type { Contact } from '../../manifest/data.generated.ts';
import type { DossierContent, DossierStudy } from '../content.ts';
import { idOf } from './identifier.ts';
import { oneLine } from './telling.ts';

/** A person or body that a dossier names. */
export interface Party {
  /** From name and email, the same in every document. */
  readonly uuid: string;
  readonly name: string;
  readonly isPerson: boolean;
  readonly email: string | undefined;
  readonly role: string | undefined;
  /** `https://orcid.org/...` */
  readonly orcid: string | undefined;
  readonly affiliation: string | undefined;
  readonly url: string | undefined;
}

/** Roles that bodies have; who has an ORCID or an affiliation is a person all the same. */
const rolesOfBodies = /\b(owner|publisher|funder|client|operator|host)\b/i;

/** Who can be asked about a study; who sealed its records where it names nobody. */
export function authorsOf(study: DossierStudy): readonly Party[] {
  const contacts = (study.facts.manifest.data.study?.contacts ?? []).flatMap(partyOf);
  return onceEach(contacts.length > 0 ? contacts : sealersOf(study));
}

export function authorsOfAll({ studies }: DossierContent): readonly Party[] {
  return onceEach(studies.flatMap(authorsOf));
}

/** Everyone who sealed a record that the study still has. */
export function sealersOf({ facts }: DossierStudy): readonly Party[] {
  return onceEach(
    [...facts.standings.values()].flatMap(({ seal }) => (seal === null ? [] : sealerOf(seal.sealed_by))),
  );
}

/** `Name <email>` as git knows them. */
export function sealerOf(sealedBy: string): Party {
  const [, name = sealedBy, email] = /^(.*?)\s*<([^<>]*)>$/.exec(sealedBy) ?? [];
  return party({ name: name === '' ? (email ?? sealedBy) : name, email: email === '' ? undefined : email });
}

function partyOf(contact: Contact): readonly Party[] {
  const name = oneLine(contact.name ?? '');
  return name === '' ? [] : [party({ ...contact, name })];
}

interface Named extends Omit<Contact, 'name' | 'email'> {
  readonly name: string;
  readonly email?: string | undefined;
}

function party({ name, email, role, orcid, affiliation, url }: Named): Party {
  const digits = /\d{4}-\d{4}-\d{4}-\d{3}[\dX]/.exec(orcid ?? '')?.[0];
  return {
    uuid: idOf('party', name, email ?? ''),
    name,
    isPerson: digits !== undefined || affiliation !== undefined || !rolesOfBodies.test(role ?? ''),
    email,
    role,
    orcid: digits === undefined ? undefined : `https://orcid.org/${digits}`,
    affiliation,
    url,
  };
}

function onceEach(parties: readonly Party[]): readonly Party[] {
  const seen = new Map<string, Party>();
  for (const one of parties) if (!seen.has(one.uuid)) seen.set(one.uuid, one);
  return [...seen.values()];
}
