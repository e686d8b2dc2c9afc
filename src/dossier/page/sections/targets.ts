import { yearBeginsOf } from '../../../facts/catchment.ts';
import { nodesIn } from '../../../facts/nodes-in.ts';
import { isDefined, type Paired } from '../../../hydrology/paired.ts';
import { climatology } from '../../../hydrology/season/climatology.ts';
import type { RecordNode } from '../../../records/record.ts';
import { durationCurve } from '../../charts/duration-curve.ts';
import { type Drawing, hydrograph, type OverTime } from '../../charts/hydrograph.ts';
import { residuals } from '../../charts/residuals.ts';
import { scatter } from '../../charts/scatter.ts';
import { seasonCycle } from '../../charts/season-cycle.ts';
import { closerLooks } from '../closer-look.ts';
import { type Block, facts, figures, heading, paragraph } from '../document.ts';
import { capital, notStated, words } from '../say.ts';
import { manyColumns, type Subject } from '../subject.ts';
import { targetSeries } from '../target-series.ts';
import { scoreTable } from './score-table.ts';

type Target = RecordNode<'evaluation'>;

/** For each target: how it was compared, its scores and its figures. One target's series are in hand at a time. */
export async function targetsSection(subject: Subject): Promise<readonly Block[]> {
  const { key } = subject;
  const targets = nodesIn(subject.facts.records.nodes, 'evaluation');
  const blocks: Block[] = [heading(1, 'Evaluation', `${key}-evaluation`)];
  if (targets.length === 0) blocks.push(paragraph('Nothing is evaluated.'));
  for (const [place, target] of targets.entries())
    blocks.push(
      heading(2, target.name ?? target.id, `${key}-target-${place + 1}`),
      ...(await oneTarget(target, subject)),
    );
  return blocks;
}

async function oneTarget(target: Target, subject: Subject): Promise<readonly Block[]> {
  const { fragment } = target;
  const { observed, simulated, review } = fragment;
  if (fragment.none_because !== undefined)
    return [paragraph(`Not evaluated, because ${fragment.none_because}`)];
  return [
    ...facts(
      ['Variable', `${words(fragment.variable ?? 'other')}, step ${fragment.step ?? notStated}`],
      ['Observed', observed === undefined ? notStated : [{ code: `inputs.${observed.input}` }]],
      [
        'Simulated',
        simulated === undefined
          ? notStated
          : [{ code: `runs.${simulated.run}` }, ', ', { code: simulated.file ?? notStated }],
      ],
      ['Split test', fragment.split_test === undefined ? null : words(fragment.split_test)],
      [
        'Review',
        review === undefined
          ? 'nobody has written what the graph shows'
          : `${review.says ?? notStated} (${review.by ?? notStated}, ${review.on ?? notStated})`,
      ],
      ['Note', fragment.note],
    ),
    ...scoreTable(target, subject),
    ...(await pictures(target, subject)),
  ];
}

async function pictures(
  target: Target,
  { facts: computed, content, columns }: Subject,
): Promise<readonly Block[]> {
  const series = await targetSeries(target, computed, content.snapshot);
  if (!isDefined(series)) return [paragraph(`No figures can be drawn: ${series.undefined}.`)];
  const { unit, overTime, calibration, validation, all } = series.value;
  const { observed, simulated, variable = 'other' } = target.fragment;
  const of = {
    name: target.name ?? target.id,
    quantity: `${capital(words(variable))}, ${unit}`,
    source: `inputs.${observed?.input} and runs.${simulated?.run} (${simulated?.file})`,
    columns,
  };
  const paired = { ...of, source: `${of.source}; pairs of calibration and validation` };
  return figures(
    hydrograph(overTime, of, 'linear'),
    hydrograph(overTime, of, 'logarithmic'),
    ...(all === null ? [] : closer(all, overTime, of, computed)),
    scatter(calibration, validation, paired),
    ...(all === null ? [] : ofPairs(all, overTime.longestStep, paired)),
  );
}

/** Two years on which the eye can rest; not where many targets make the page long. */
function closer(all: Paired, overTime: OverTime, of: Drawing, { manifest }: Subject['facts']) {
  if (of.columns < manyColumns) return [];
  const { highest, lowest } = closerLooks(all, overTime, yearBeginsOf(manifest.data));
  return [
    hydrograph(highest.series, of, 'linear', highest.when),
    hydrograph(lowest.series, of, 'logarithmic', lowest.when),
  ];
}

function ofPairs(all: Paired, longestStep: number, of: Drawing) {
  const twelve = climatology(all);
  return [
    residuals(all, longestStep, of),
    durationCurve(all, of),
    isDefined(twelve) ? seasonCycle(twelve.value, of) : null,
  ];
}
