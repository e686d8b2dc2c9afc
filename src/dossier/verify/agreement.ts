import { contentsName } from '../layout.ts';
import type { PackageProblem } from './findings.ts';
import type { Inventory } from './inventory.ts';
import { fieldIn, listIn, parsed, type Told, toldByContents, toldByFacts, toldByFindings } from './told.ts';

interface Agreement {
  readonly problems: readonly PackageProblem[];
  readonly notes: readonly string[];
}

/** Documents that name the whole id of the commit. */
const namingCommit = /(?:\.cff|\.html|\.md|(?:crosswalk|datacite|facts|prov|ro-crate-metadata)\.json)$/;

const telling: Readonly<Record<string, (document: unknown) => Told>> = {
  'facts.json': toldByFacts,
  'findings.json': toldByFindings,
};

/**
 * Whether the documents of a dossier tell of one commit, one verdict, the same records and files: each is held against
 * `contents.json`. `top` is the folder in which they lie, with a final `/` where there is one.
 */
export function checkAgreement({ files }: Inventory, top: string): Agreement {
  const name = `${top}${contentsName}`;
  const contents = files.get(name);
  if (contents === undefined) {
    return {
      problems: [],
      notes: ['There is no contents.json of a dossier, so only digests and lists were checked.'],
    };
  }
  const subject = parsed(contents.text);
  const commit = fieldIn(subject, 'commit');
  if (
    fieldIn(subject, 'format') !== 'stoplog-contents/1' ||
    typeof commit !== 'string' ||
    !/^[0-9a-f]{40,64}$/.test(commit)
  ) {
    return { problems: [broken(name, 'is not the list of contents of a dossier')], notes: [] };
  }
  const expected = toldByContents(subject);
  const problems: PackageProblem[] = [];
  for (const [path, { text }] of files) {
    const own = path.slice(top.length);
    if (!path.startsWith(top) || own.includes('/')) continue;
    if (namingCommit.test(own) && text?.includes(commit) !== true) {
      problems.push(broken(path, `does not name the commit ${commit} of ${contentsName}`));
    }
    const told = telling[own];
    if (told !== undefined) problems.push(...differences(path, told(parsed(text)), expected));
  }
  return { problems: [...problems, ...payloadProblems(subject, files, name)], notes: [] };
}

/** What one document tells otherwise, or leaves out of the kinds of things that it tells. */
function differences(path: string, told: Told, expected: Told): readonly PackageProblem[] {
  const kinds = new Set([...told.keys()].map(kindOf));
  const statements = new Set([
    ...told.keys(),
    ...[...expected.keys()].filter((key) => kinds.has(kindOf(key))),
  ]);
  return [...statements].flatMap((statement) => {
    const says = told.get(statement) ?? 'nothing';
    const others = expected.get(statement) ?? 'nothing';
    return says === others
      ? []
      : [broken(path, `says ${says} for the ${statement}, but ${contentsName} says ${others}`)];
  });
}

function kindOf(statement: string): string {
  return statement.split(' ', 1)[0] ?? '';
}

/** The study's files that are there must be those that the contents name. */
function payloadProblems(
  subject: unknown,
  files: Inventory['files'],
  name: string,
): readonly PackageProblem[] {
  return listIn(subject, 'files').flatMap((listed) => {
    const lies = fieldIn(listed, 'lies');
    const found = typeof lies === 'string' ? files.get(`data/${lies}`.normalize('NFC')) : undefined;
    return found === undefined || found.sha256 === fieldIn(listed, 'sha256')
      ? []
      : [broken(`data/${lies}`, `is another file than ${name} names`)];
  });
}

function broken(file: string, message: string): PackageProblem {
  return { kind: 'broken', file, message };
}
