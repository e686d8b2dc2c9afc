import { type Links, linkRecords } from './link.ts';
import { fromFolder, fromTop } from './paths.ts';
import { type RecordNode, type Records, sha256Of } from './record.ts';
import { schemes as known, newest, type Schemes } from './schemes.ts';
import type { Change, Seal, SealsFile, Standing } from './seal.ts';
import { findTrails } from './trails.ts';

/** How each present record stands against its seal, judged by the scheme that the seal was made with. */
export function judgeStandings(
  records: Records,
  { seals }: Pick<SealsFile, 'seals'>,
  schemes: Schemes = known,
): ReadonlyMap<string, Standing> {
  const linksBy = linksOf(records, schemes);
  const standings = new Map<string, Standing>();
  for (const record of records.nodes.values()) {
    const seal = seals.get(record.id);
    const base = {
      record: record.id,
      reworded: false,
      oldScheme: false,
      changes: [],
      trails: [],
      fallen: [],
    };
    if (seal === undefined) {
      standings.set(record.id, { ...base, seal: null, state: 'unsealed' });
      continue;
    }
    const links = linksBy(seal.scheme);
    if (links.digests.get(record.id) === seal.digest) {
      const reworded = seal.wording !== record.wording;
      const oldScheme = seal.scheme < newest(schemes).number;
      standings.set(record.id, { ...base, seal, state: 'sealed', reworded, oldScheme });
    } else {
      const changes = changesSince(seal, record, links, records.manifest.folder);
      const fallen = [...record.accepts.keys()].filter((place) =>
        seal.accepts.includes(record.accepts[place] ?? ''),
      );
      standings.set(record.id, { ...base, seal, state: 'stale', changes, fallen });
    }
  }
  for (const [id, standing] of standings) {
    if (standing.state === 'stale') standings.set(id, { ...standing, trails: findTrails(id, standings) });
  }
  return standings;
}

/** Links and digests of the records by any scheme, worked out once; an unknown scheme is taken for the records' own. */
export function linksOf(records: Records, schemes: Schemes): (scheme: number) => Links {
  const restsOn = new Map([...records.nodes.values()].map((node) => [node.id, node.restsOn]));
  const current: Links = { scheme: records.scheme, restsOn, digests: records.digests };
  const worked = new Map<number, Links>([[current.scheme, current]]);
  return (number) => {
    const scheme = schemes.find((one) => one.number === number);
    const links =
      worked.get(number) ??
      (scheme === undefined ? current : linkRecords(scheme, records.manifest, records.nodes));
    worked.set(number, links);
    return links;
  };
}

/** What is not as it was when sealed: first the statement, then files by path, then what the record rests on. */
function changesSince(seal: Seal, record: RecordNode, links: Links, folder: string): readonly Change[] {
  const changes: Change[] = seal.substance === record.substance ? [] : [{ kind: 'substance' }];
  const sealedPaths = Object.keys(seal.files).map((path) => fromTop(folder, path));
  for (const path of [...new Set([...sealedPaths, ...record.claims.keys()])].sort()) {
    const was = seal.files[fromFolder(folder, path)] ?? null;
    const now = record.claims.get(path)?.identity ?? null;
    if (was === null || now === null || was.sha256 !== sha256Of(now))
      changes.push({ kind: 'file', path, was, now });
  }
  const below = links.restsOn.get(record.id) ?? [];
  for (const id of [...new Set([...Object.keys(seal.rests_on), ...below])].sort()) {
    const was = seal.rests_on[id] ?? null;
    const now = below.includes(id) ? (links.digests.get(id) ?? null) : null;
    if (was !== now) changes.push({ kind: 'rests-on', id, was, now });
  }
  return changes;
}
