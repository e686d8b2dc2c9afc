import type { FieldPath } from '../../manifest/manifest.ts';
import { acceptancesIn } from '../accepted.ts';
import { loosens } from '../departure.ts';
import { type Draft, rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';

export const waiverUnsigned = rule({
  id: 'waiver.unsigned',
  scope: 'manifest',
  from: 'setup',
  means: null,
  statement:
    'A waiver lacks its reason, person or last day; an acceptance or a departure that asks for less lacks its reason, person or date; any departure lacks its reason.',
  why: 'A reader of the study must be able to ask the person who let a poor fit or a missing record pass, and to judge the reason.',
  source: { basis: 'house', citation: 'Our own choice: nothing passes on nobody’s word.' },
  clear: 'Fill `because`, `by`, and the date: `until` for a waiver, `on` for an acceptance or a departure.',
  check: (_, { manifest, known }) => [
    ...(manifest.data.waivers ?? []).flatMap((waiver, place) =>
      unsigned(`waiver of ${waiver.rule}`, 'manifest', ['waivers', place], {
        because: waiver.because,
        by: waiver.by,
        until: waiver.until,
      }),
    ),
    ...(manifest.data.departures ?? []).flatMap((departure, place) =>
      unsigned(
        `departure from ${departure.rule ?? departure.threshold ?? 'nothing'}`,
        'manifest',
        ['departures', place],
        loosens(departure, known)
          ? { because: departure.because, by: departure.by, on: departure.on }
          : { because: departure.because },
      ),
    ),
    ...acceptancesIn(manifest.data).flatMap(({ field, acceptance }) =>
      unsigned(`acceptance of ${acceptance.rule}`, 'manifest', field, {
        because: acceptance.because,
        by: acceptance.by,
        on: acceptance.on,
      }),
    ),
  ],
});

const asked: Readonly<Record<string, string>> = {
  because: 'no reason (`because`)',
  by: 'no person (`by`)',
  on: 'no date (`on`)',
  until: 'no last day (`until`)',
};

function unsigned(
  what: string,
  record: string,
  field: FieldPath,
  signature: Readonly<Record<string, string | undefined>>,
): readonly Draft[] {
  const lacking = Object.entries(signature).filter(([, text]) => !isStated(text));
  if (lacking.length === 0) return [];
  const said = lacking.map(([key]) => asked[key]).join(', ');
  return [{ record, field, subject: what, message: `The ${what} gives ${said}.` }];
}
