import { nodesIn } from '../../../facts/nodes-in.ts';
import type { Environment } from '../../../manifest/data.generated.ts';
import { type Block, facts, heading, paragraph, type Text } from '../document.ts';
import { notStated } from '../say.ts';
import type { Subject } from '../subject.ts';

/** How a stranger checks what is said here, and runs the model again. */
export function rerunSection(subject: Subject): readonly Block[] {
  const { facts: computed, content, key } = subject;
  const { model } = computed.manifest.data;
  const { folder } = computed.manifest;
  const runs = nodesIn(computed.records.nodes, 'runs');
  return [
    heading(1, 'How to verify and rerun', `${key}-rerun`),
    paragraph('To check the bytes of this package, in the folder that holds its manifest-sha256.txt:'),
    { kind: 'commands', lines: ['sha256sum -c manifest-sha256.txt', 'stoplog dossier --verify .'] },
    paragraph('To check the records against the files, in a clone of the repository:'),
    { kind: 'commands', lines: [`stoplog check --at ${content.commit}`] },
    paragraph(
      'To run the model again, in a clean copy of this commit; each run is started as its record says:',
    ),
    {
      kind: 'commands',
      lines: [`git checkout ${content.commit}`, ...(folder === '' ? [] : [`cd ${quoted(folder)}`])],
    },
    ...(model?.environment === undefined ? [] : facts(['Needs', environmentText(model.environment)])),
    ...runs.flatMap(({ id, fragment }, place): readonly Block[] => [
      heading(2, id, `${key}-run-${place + 1}`),
      ...(fragment.start === undefined
        ? [paragraph('How it is started is not stated.')]
        : [{ kind: 'commands' as const, lines: [fragment.start.map(quoted).join(' ')] }]),
      ...facts(
        ['Folder', fragment.folder],
        ['Takes', codes(fragment.takes)],
        ['Gives', codes((fragment.gives ?? []).map((file) => (typeof file === 'string' ? file : file.path)))],
        ['Needs', fragment.environment === undefined ? null : environmentText(fragment.environment)],
        ['Ran on', fragment.ran_on],
        [
          'Outputs agree within',
          fragment.agreement === undefined
            ? null
            : `${fragment.agreement.relative ?? 0} of the value or ${fragment.agreement.absolute ?? 0}${fragment.agreement.leave_out === undefined ? '' : `, without ${fragment.agreement.leave_out.join(', ')}`}`,
        ],
      ),
    ]),
  ];
}

function codes(names: readonly string[] | undefined): Text | null {
  if (names === undefined || names.length === 0) return null;
  return names.flatMap((name, place) => [place === 0 ? '' : ', ', { code: name }]);
}

function environmentText({
  runtime,
  version,
  operating_system,
  compiler,
  packages,
  container,
}: Environment): string {
  return (
    [
      [runtime, version].filter((part) => part !== undefined).join(' '),
      operating_system,
      compiler,
      ...Object.entries(packages ?? {}).map(([name, of]) => `${name} ${of}`),
      container === undefined ? undefined : `container ${container.image} ${container.digest ?? ''}`,
    ]
      .filter((part) => part !== undefined && part !== '')
      .join(', ') || notStated
  );
}

/** A word as a shell takes it; in quotes unless it is plain. */
function quoted(word: string): string {
  return /^[\w./:=@%+,-]+$/.test(word) ? word : `'${word.replaceAll("'", "'\\''")}'`;
}
