import type { ScoredWindow } from '../../facts/scores/stated.ts';
import type { ComparedScore, TargetFigures } from '../../facts/scores.ts';
import { isDefined } from '../../hydrology/paired.ts';
import type { RecordNode } from '../../records/record.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { whileAway } from '../while-away.ts';
import { causesInWords } from './causes-in-words.ts';
import { type DifferingTogether, differingTogether } from './differing-together.ts';
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
      ...differingTogether(figures.stated).map((scores) => differing(record, scores, figures)),
    ];
  },
});

/** One finding where none of the stated scores can be recomputed. */
function asAWhole({ id, name, field }: RecordNode, figures: TargetFigures): Draft | null {
  const { recomputed, away, stated } = figures;
  if (isDefined(recomputed) || stated.length === 0) return null;
  return {
    record: id,
    field: [...field, 'simulated'],
    message: `The scores of ${name} can’t be recomputed: ${recomputed.undefined}.`,
    ...(away === null
      ? { clear: 'State observed and simulated so that both can be read, in units that fit.' }
      : whileAway(away)),
  };
}

function differing(record: RecordNode, scores: DifferingTogether, figures: TargetFigures): Draft {
  const [first, ...others] = scores;
  if (others.length === 0) return differingAlone(record, first, figures);
  const { window, at, field, recomputed, causes } = first;
  const about = {
    record: record.id,
    field: at === null ? field.slice(0, -1) : field,
    ...(at ?? {}),
    subject: window,
  };
  const what = `${scores.map(({ score }) => scoreNames[score]).join(', ')} of ${record.name} over ${window}`;
  if (!isDefined(recomputed))
    return { ...about, message: `The ${what} can’t be recomputed: ${recomputed.undefined}.` };
  const cause =
    causes.length === 0
      ? 'Where no score of a window agrees, it is rather another run, column or window that was scored.'
      : `Each stated figure is ${causesInWords(causes)}.`;
  return {
    ...about,
    message: `The ${what} are not what the files give. ${cause}`,
    detail: [
      ...scores.map(
        (score) => `${scoreNames[score.score]}: stated ${asPrinted(score.printed)}, found ${foundFor(score)}`,
      ),
      ...recomputedFrom(figures, window),
    ],
  };
}

function differingAlone({ id, name }: RecordNode, score: ComparedScore, figures: TargetFigures): Draft {
  const { window, printed, recomputed, causes, field, at } = score;
  const unit = unitOf(score.score, isDefined(figures.recomputed) ? figures.recomputed.value.unit : '1');
  const what = `${scoreNames[score.score]} of ${name} over ${window}`;
  const about = {
    record: id,
    field,
    ...(at ?? {}),
    subject: `${window} ${score.score}`,
    stated: printed.value,
    ...(unit === null ? {} : { unit }),
  };
  if (!isDefined(recomputed))
    return { ...about, message: `The ${what} can’t be recomputed: ${recomputed.undefined}.` };
  const found = foundFor(score);
  const cause = causes.length === 0 ? '' : ` The stated figure is ${causesInWords(causes)}.`;
  return {
    ...about,
    found: Number(found),
    message: `The ${what} is stated as ${asPrinted(printed)}; the files give ${found}.${cause}`,
    detail: recomputedFrom(figures, window),
  };
}

/** The recomputed figure with two decimals more than the stated one has. */
function foundFor({ printed, recomputed }: ComparedScore): string {
  if (!isDefined(recomputed)) return recomputed.undefined;
  return String(Number(asPrinted({ value: recomputed.value, decimals: printed.decimals + 2 })));
}

function recomputedFrom(figures: TargetFigures, window: ScoredWindow): readonly string[] {
  const over = recomputedOver(figures, window);
  if (over === null) return [];
  const { periods, pairs, windowSteps } = over;
  return [`recomputed over ${periods.join(', ')}: ${figure(pairs)} of ${figure(windowSteps)} steps paired`];
}
