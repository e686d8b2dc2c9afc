import { rule } from '../rule.ts';

export const modelExecutableUnidentified = rule({
  id: 'model.executable-unidentified',
  scope: 'model',
  from: 'validation',
  means: 'incomplete',
  statement:
    'The program that ran is identified by neither its file’s SHA-256, nor a container digest, nor a source commit.',
  why: 'A release number is what people believe ran. A digest or commit is what did: local builds, other compilers and patched copies carry the same number and give other flows.',
  source: { basis: 'practice', citation: 'Common practice: an executable is identified by its content.' },
  clear:
    'Name the program’s files in `model.executable` (with their sha256 if they are kept outside git), or write `model.container.digest` or `model.source.commit`.',
  check({ id, claims, elsewhere, fragment: { container, source } }) {
    const files = [...claims.values()].filter(({ field }) => field[1] === 'executable');
    const identified =
      files.some(({ identity }) => identity.kind !== 'unavailable') ||
      elsewhere.some(({ field, sha256 }) => field[1] === 'executable' && sha256 !== undefined) ||
      container?.digest !== undefined ||
      /^[0-9a-f]{7,64}$/.test(source?.commit ?? '');
    if (identified) return [];
    return [
      {
        record: id,
        field: ['model', 'executable'],
        message:
          'Nothing fixes which program ran: no file with its SHA-256, no container digest (sha256: and 64 hexadecimal digits), no source commit (at least 7 hexadecimal digits).',
      },
    ];
  },
});
