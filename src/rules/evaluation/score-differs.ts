import type { ComparedScore, TargetFigures } from '../../facts/scores.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { causesInWords } from './causes-in-words.ts';
import { recomputedOver } from './over.ts';
import { asPrinted, scoreNames, unitOf } from './score-names.ts';

export const evaluationScoreDiffers = rule({
  id: 'evaluation.score-differs',
  scope: 'evaluation',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'A stated score is not the one that the files give, within its printed decimals, or can’t be recomputed from them.',
  why: 'A score is what decisions are made on. When the files give another one, it belongs to another run, another window or another statistic.',
  source: {
    basis: 'definition',
    citation:
      'Follows from the words: a score is that of the stated series over the stated windows. Formulas: Moriasi et al. (2007) Trans. ASABE 50(3):885-900; Gupta et al. (2009) J. Hydrol. 377:80-91',
  },
  clear:
    'Find out which figure is wrong. If the run is the right one, `stoplog seal --all --figures` writes the recomputed scores; then look at the graph.',
  check: (record, { scores }) => {
    const figures = scores.get(record.name ?? '');
    if (figures === undefined) return [];
    const unread = figures.unread.map(({ file, line, expected, found }) => ({
      record: record.id,
      subject: `${file} ${line}`,
      file,
      line,
      message: `A row of the score table can’t be read: expected ${expected}, received "${found}".`,
      clear: 'Correct the row; columns are `window`, `score` and `value`.',
    }));
    const whole = asAWhole(record, figures);
    if (whole !== null) return [...unread, whole];
    return [
      ...unread,
      ...figures.stated.filter(({ agrees }) => !agrees).map((score) => differing(record, score, figures)),
    ];
  },
});

/** One finding where none of the stated scores can be recomputed. */
function asAWhole({ id, name, field }: RecordNode, figures: TargetFigures): Draft | null {
  const { recomputed, isHere, stated } = figures;
  if (isDefined(recomputed) || stated.length === 0) return null;
  return {
    record: id,
    field: [...field, 'simulated'],
    message: `The scores of ${name} can’t be recomputed: ${recomputed.undefined}.`,
    ...(isHere
      ? { clear: 'State observed and simulated so that both can be read, in units that fit.' }
      : {
          from: 'archive',
          before: 'warn',
          clear: 'Fetch the content (git lfs pull, or a full clone) and check again.',
        }),
  };
}

function differing({ id, name }: RecordNode, score: ComparedScore, figures: TargetFigures): Draft {
  const { window, printed, recomputed, causes, field, at } = score;
  const unit = unitOf(score.score, isDefined(figures.recomputed) ? figures.recomputed.value.unit : '1');
  const what = `${scoreNames[score.score]} of ${name} over ${window}`;
  const common = {
    record: id,
    field,
    ...(at ?? {}),
    subject: `${window} ${score.score}`,
    stated: printed.value,
    ...(unit === null ? {} : { unit }),
  };
  if (!isDefined(recomputed))
    return { ...common, message: `The ${what} can’t be recomputed: ${recomputed.undefined}.` };
  const found = Number(asPrinted({ value: recomputed.value, decimals: printed.decimals + 2 }));
  const cause = causes.length === 0 ? '' : ` The stated figure is ${causesInWords(causes)}.`;
  const over = recomputedOver(figures, window);
  return {
    ...common,
    found,
    message: `The ${what} is stated as ${asPrinted(printed)}; the files give ${found}.${cause}`,
    ...(over === null
      ? {}
      : {
          detail: [
            `recomputed over ${over.periods.join(', ')}: ${figure(over.pairs)} of ${figure(over.windowSteps)} steps paired`,
          ],
        }),
  };
}
