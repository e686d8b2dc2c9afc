import { rule } from '../rule.ts';

const moving =
  /^(?:latest|current|newest|recent|stable|unstable|dev|devel|develop|development|main|master|trunk|head|tip|default|nightly|snapshot|beta|alpha|final|new|any|(?:origin|feature|release|bugfix|hotfix)\/.*|.*[-._]snapshot)$/i;
const year = /^(?:19|20)\d\d$/;

export const modelVersionVague = rule({
  id: 'model.version-vague',
  scope: 'model',
  from: 'setup',
  means: 'incomplete',
  statement:
    'The version or release is a word that moves (`latest`, `dev`), a bare year or the name of a branch.',
  why: 'Two builds of one catchment model can give different flows from the same inputs. `latest` or a branch means another program next month, and a year may hold many releases.',
  source: { basis: 'practice', citation: 'Common practice: a version names one build.' },
  clear:
    'Write the number that the model prints or that its release carries, such as version "1.4", release "1.4.2".',
  check: ({ id, fragment }) =>
    (['version', 'release'] as const).flatMap((key) => {
      const stated = fragment[key];
      if (stated === undefined || !(moving.test(stated.trim()) || year.test(stated.trim()))) return [];
      return {
        record: id,
        field: ['model', key],
        subject: key,
        stated,
        message: year.test(stated.trim())
          ? `The model’s ${key} is given as the year ${stated} only, which can’t tell one release of that year from another.`
          : `The model’s ${key} is given as \`${stated}\`, which names whatever is newest and not the build that ran.`,
      };
    }),
});
