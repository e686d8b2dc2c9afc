import { rule } from '../rule.ts';

export const manifestCircle = rule({
  id: 'manifest.circle',
  scope: 'manifest',
  from: 'setup',
  means: null,
  statement: 'Records rest on each other in a circle.',
  why: 'A score that rests on a run that rests on the score has no beginning: nothing in the circle can be shown to be true.',
  source: { basis: 'definition', citation: 'What a record rests on must be settled before it.' },
  clear: 'Take one of these links out of `rests_on`, `takes` or `on`.',
  check(_, { records: { circle } }) {
    if (circle === null) return [];
    const [first = 'manifest'] = circle;
    return [
      {
        record: first,
        subject: circle.slice(1).toSorted().join(' '),
        found: circle.join(' <- '),
        message: `These records rest on each other in a circle: ${circle.join(' <- ')}.`,
      },
    ];
  },
});
