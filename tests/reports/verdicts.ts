import { examine } from '../../src/commands/examine.ts';
import { snapshotFromMemory } from '../../src/repository/memory.ts';
import type { Comparison, Finding, ManifestVerdict, Verdict } from '../../src/verdict/finding.ts';
import { concludeVerdict } from '../../src/verdict/judge.ts';
import { finding } from '../harness/finding.ts';
import { example } from '../planted/fennock.ts';

const checked = (files: Readonly<Record<string, string>>) =>
  examine(snapshotFromMemory(files), { today: '2025-04-01' });

/** The example project as it stands. */
export const sound = checked(example);

const rain = 'data/rain/high-tarrow.csv';

/** The example after a rain file lost its last rows and the manifest its model's release. */
export const faulty = checked({
  ...example,
  [rain]: (example[rain] ?? '').split('\n').slice(0, -200).join('\n'),
  'stoplog.yaml': (example['stoplog.yaml'] ?? '').replace(/^ {2}release: .*\n/m, ''),
});

/** An invented verdict on these findings. */
export function verdictOf(
  findings: readonly Finding[],
  over: Partial<ManifestVerdict> = {},
  comparison: Comparison | null = null,
): Verdict {
  const records = [...new Set(findings.map(({ record }) => record)), 'model'].map((id) => ({
    ...{ id, state: id === 'model' ? ('sound' as const) : ('stale' as const), grade: 'stated' },
    ...{ sealed_on: '2020-03-02', sealed_by: 'A <a@b.example>' },
  }));
  return concludeVerdict(
    'HEAD',
    comparison === null ? null : '4be1c07',
    [
      {
        ...{
          path: 'stoplog.yaml',
          study: 'Low-flow model',
          phase: 'application',
          departures: [],
          cured: [],
          changed: [],
        },
        ...{ records, findings },
        ...over,
      },
    ],
    comparison,
  );
}

const levels = ['note', 'warn', 'block'] as const;

/** A thousand findings of each level, mildest first. */
export const large: Verdict = verdictOf(
  Array.from({ length: 3000 }, (_, index) =>
    finding({
      level: levels[Math.floor(index / 1000)] ?? 'block',
      record: `inputs.gauge-${index}`,
      file: `data/gauge ${index}.csv`,
      line: index + 1,
      fingerprint: index.toString(16).padStart(16, '0'),
    }),
  ),
);

/** Texts that try to get out of where they are written. */
export const hostileTexts: readonly string[] = [
  '::error::mine',
  ' ::set-output name=verdict::pass',
  'first\n::stop-commands::x',
  'first\r::add-mask::a',
  'first\u0085::warning::b\u2028::error::c',
  '##[error]mine',
  'see ###[error]mine or ##vso[task.setvariable variable=x]mine',
  'a,file=x:y%0A%25::b',
  '<script>alert(1)</script> & "quoted" \'so\'',
  ']]> --> <!-- <?xml?>',
  '[click](https://bad.example) ![p](x) `code` | cell | **b** _i_ <b>',
  '@everyone #1 !2 ~3 $x$',
  '/close\n/merge',
  '\u001b[2Jgone\u0000\u0001\ufffe\ud800 alone \u202eback',
  'section_start:1:mine\r\u001b[0K \u2066left\u2069',
  '降水量/観測 grün 50%.csv',
  '{0} {{1}}',
];

/** A finding for each, with the text wherever a stranger can put one. */
export const hostile: Verdict = verdictOf(
  hostileTexts.flatMap((text, index) => {
    const everywhere = {
      ...{ message: text, record: `inputs.${text}`, file: `data/${text.replaceAll('\ud800', '')}` },
      ...{ detail: [text], stated: text, found: text, unit: text, trail: ['inputs', text], clear: text },
    };
    return [
      finding({ ...everywhere, fingerprint: `a${index}` }),
      finding({ ...everywhere, fingerprint: `b${index}`, waived: `${text} (${text}, until 2030-01-01)` }),
      finding({ ...everywhere, fingerprint: `c${index}`, standing: true }),
    ];
  }),
  {
    study: hostileTexts.join(' '),
    departures: hostileTexts.map((text) => ({ of: text, now: text, because: text, loosens: true })),
    cured: hostileTexts.map((text) => ({ rule: text, record: text, message: text, fingerprint: 'd' })),
    changed: hostileTexts.map((text) => ({ record: `inputs.${text}`, what: [text, text] })),
  },
  { asked: '::error::mine', strict: false, unavailable: null, notes: hostileTexts },
);

/** Every verdict that each report is held against, by what it is. */
export async function everyVerdict(): Promise<readonly (readonly [name: string, verdict: Verdict])[]> {
  return [
    ['the sound example', await sound],
    ['the example with faults', await faulty],
    ['3 000 findings', large],
    ['hostile texts', hostile],
    ['a manifest that can’t be read', await checked({ 'stoplog.yaml': 'stoplog: 1\nstudy: [\n' })],
  ];
}
