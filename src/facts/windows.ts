import type { FieldPath, Manifest } from '../manifest/manifest.ts';
import { type Period, parsePeriod } from '../manifest/period.ts';
import type { RecordNode, Records } from '../records/record.ts';
import { nodesIn } from './nodes-in.ts';

/** A window as the manifest states it. */
export interface StatedWindow {
  readonly kind: 'warm-up' | 'calibration' | 'validation';
  readonly field: FieldPath;
  readonly period: Period;
}

/** The windows of the study, or of one target that differs from it. */
export interface WindowSet {
  /** `periods`, or the target's record. */
  readonly record: string;
  readonly windows: readonly StatedWindow[];
}

/**
 * The study's windows first, then those of each target that states windows of its own, or whose run has a warm-up of its own; the
 * study's fill what they leave out.
 */
export function windowSets({ manifest, nodes }: Records): readonly WindowSet[] {
  const seen = new Set<string>();
  const own = nodesIn(nodes, 'evaluation').filter((target) => {
    const fragment = target.field.join('.');
    const first = !seen.has(fragment);
    seen.add(fragment);
    return (
      first && (target.fragment.periods !== undefined || runOf(target, nodes)?.fragment.warm_up !== undefined)
    );
  });
  return [
    { record: 'periods', windows: windowsIn(manifest.data.periods ?? {}, ['periods']) },
    ...own.map((target) => ({
      record: target.id,
      windows: windowsOfTarget(target, { manifest, nodes }),
    })),
  ];
}

/** The windows over which a target is scored, and the warm-up that is kept out of them: its own, its run's, or the study's. */
export function windowsOfTarget(
  target: RecordNode<'evaluation'>,
  { manifest, nodes }: Pick<Records, 'manifest' | 'nodes'>,
): readonly StatedWindow[] {
  return windowsFrom([
    { stated: target.fragment.periods ?? {}, base: [...target.field, 'periods'] },
    ...sourcesOfRun(runOf(target, nodes), manifest),
  ]);
}

/** The windows of a run: its own warm-up, and what the study states besides. */
export function windowsOfRun(
  run: RecordNode<'runs'> | undefined,
  { manifest }: Pick<Records, 'manifest'>,
): readonly StatedWindow[] {
  return windowsFrom(sourcesOfRun(run, manifest));
}

interface Source {
  readonly stated: Stated;
  readonly base: FieldPath;
}

function sourcesOfRun(run: RecordNode<'runs'> | undefined, { data }: Manifest): readonly Source[] {
  return [
    { stated: { warm_up: run?.fragment.warm_up }, base: run?.field ?? [] },
    { stated: data.periods ?? {}, base: ['periods'] },
  ];
}

/** Each kind of window as the first source states it. */
function windowsFrom(sources: readonly Source[]): readonly StatedWindow[] {
  const keys = ['warm_up', 'calibration', 'validation'] as const;
  return keys.flatMap((key) => {
    const source = sources.find(({ stated }) => stated[key] !== undefined);
    return source === undefined ? [] : windowsIn({ [key]: source.stated[key] }, source.base);
  });
}

/** The run that simulates a target. */
export function runOf(
  { fragment }: RecordNode<'evaluation'>,
  nodes: Records['nodes'],
): RecordNode<'runs'> | undefined {
  return nodes.get(`runs.${fragment.simulated?.run}`) as RecordNode<'runs'> | undefined;
}

interface Stated {
  readonly warm_up?: string | { readonly zero_because: string } | undefined;
  readonly calibration?: readonly string[] | undefined;
  readonly validation?: readonly string[] | undefined;
}

function windowsIn(stated: Stated, base: FieldPath): readonly StatedWindow[] {
  const texts = [
    ...(typeof stated.warm_up === 'string'
      ? [{ kind: 'warm-up' as const, field: [...base, 'warm_up'], text: stated.warm_up }]
      : []),
    ...(['calibration', 'validation'] as const).flatMap((kind) =>
      (stated[kind] ?? []).map((text, index) => ({ kind, field: [...base, kind, index], text })),
    ),
  ];
  return texts.flatMap(({ kind, field, text }) => {
    const period = parsePeriod(text);
    return period === null ? [] : [{ kind, field, period }];
  });
}
