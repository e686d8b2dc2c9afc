import type { Finding, Level } from '../../../verdict/finding.ts';
import { type Block, heading, paragraph, type Text } from '../document.ts';
import { count } from '../say.ts';
import type { Subject } from '../subject.ts';

const titles: Readonly<Record<Level, string>> = { block: 'To clear', warn: 'Warnings', note: 'Notes' };
const mostListed = 200;

/** What the rules found that nobody has answered for. */
export function findingsSection({ verdict, key }: Subject): readonly Block[] {
  const open = verdict.findings.filter(({ waived, accepted }) => waived === null && accepted === null);
  const levels = ['block', 'warn', 'note'] as const;
  return [
    heading(1, 'Findings', `${key}-findings`),
    ...(open.length === 0
      ? [paragraph('The rules found nothing that somebody would still have to answer for.')]
      : []),
    ...levels.flatMap((level) => {
      const here = open.filter((finding) => finding.level === level);
      const more = here.length - mostListed;
      return here.length === 0
        ? []
        : [
            heading(2, `${titles[level]} (${here.length})`, `${key}-findings-${level}`),
            { kind: 'list' as const, items: here.slice(0, mostListed).map(told) },
            ...(more > 0 ? [paragraph(`And ${count(more, 'more finding')}; findings.json has all.`)] : []),
          ];
    }),
  ];
}

function told({ record, message, detail, file, line, rule }: Finding): Text {
  return [
    { code: record },
    `: ${message} `,
    ...(detail.length === 0 ? [] : [`${detail.join('; ')} `]),
    `(${rule}, ${file} line ${line})`,
  ];
}
