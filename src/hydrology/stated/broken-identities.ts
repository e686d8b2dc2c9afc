import { type PrintedNumber, printedInterval } from './printed-number.ts';

/** Scores stated for one series over one window, each as printed; PBIAS in percent. */
export interface StatedScores {
  readonly nse?: PrintedNumber;
  readonly rsr?: PrintedNumber;
  readonly pbias?: PrintedNumber;
  readonly beta?: PrintedNumber;
  readonly r?: PrintedNumber;
  readonly r2?: PrintedNumber;
  readonly alpha?: PrintedNumber;
  readonly kge?: PrintedNumber;
}

export type Identity =
  | 'RSR = sqrt(1 - NSE)'
  | 'PBIAS = 100 (1 - beta)'
  | 'R2 = r^2'
  | 'NSE <= r^2'
  | 'KGE of its parts'
  | 'possible value';

export interface BrokenIdentity {
  readonly identity: Identity;
  /** The scores that cannot all be true. */
  readonly scores: readonly (keyof StatedScores)[];
}

interface Interval {
  readonly lowest: number;
  readonly highest: number;
}

/**
 * Stated scores that cannot all be true, whatever the data.
 *
 * Formula: RSR = sqrt(1 - NSE); PBIAS = 100 (1 - beta); R2 = r^2; NSE <= r^2 (the best linear rescaling reaches it);
 * KGE = 1 - sqrt((r - 1)^2 + (alpha - 1)^2 + (beta - 1)^2); NSE, KGE, |r| and R2 at most 1; RSR, R2 and alpha at least 0
 * Inputs: scores of one series, window and time step, with their printed decimals.
 * Range: a list of broken identities; best empty.
 * Read: a broken one means a slip of the pen, two windows or two runs mixed, or another statistic under the name.
 * Undefined: never; a score that is not stated breaks nothing.
 * Variant: decimals count as rounded; two figures agree when any values they could stand for agree.
 * Source: algebra on Moriasi et al. 2007, Trans. ASABE 50(3):885-900, eqs. 1-3; Gupta et al. 2009, J. Hydrol. 377:80-91.
 * Example: brokenIdentities({nse: {value: 0.9, decimals: 2}, r2: {value: 0.8, decimals: 2}}) -> [{identity: 'NSE <= r^2', scores: ['nse', 'r2']}]
 */
export function brokenIdentities(stated: StatedScores): BrokenIdentity[] {
  const broken: BrokenIdentity[] = [];
  const impossible = limits.filter(({ score, lowest, highest }) => {
    const value = interval(stated[score]);
    return value !== null && (value.lowest > highest || value.highest < lowest);
  });
  for (const { score } of impossible) broken.push({ identity: 'possible value', scores: [score] });

  const nse = interval(stated.nse);
  const rsr = interval(stated.rsr);
  if (nse && rsr && apart(rsr, { lowest: root(1 - nse.highest), highest: root(1 - nse.lowest) }))
    broken.push({ identity: 'RSR = sqrt(1 - NSE)', scores: ['nse', 'rsr'] });

  const pbias = interval(stated.pbias);
  const beta = interval(stated.beta);
  if (pbias && beta) {
    const implied = { lowest: 100 * (1 - beta.highest), highest: 100 * (1 - beta.lowest) };
    if (apart(pbias, implied)) broken.push({ identity: 'PBIAS = 100 (1 - beta)', scores: ['pbias', 'beta'] });
  }

  const r = interval(stated.r);
  const r2 = interval(stated.r2);
  const squared = r && squares(r);
  if (r2 && squared && apart(r2, squared)) broken.push({ identity: 'R2 = r^2', scores: ['r', 'r2'] });
  for (const [score, reach] of [['r2', r2] as const, ['r', squared] as const])
    if (nse && reach && nse.lowest > reach.highest + rounding)
      broken.push({ identity: 'NSE <= r^2', scores: ['nse', score] });

  const kge = interval(stated.kge);
  const alpha = interval(stated.alpha);
  if (kge && r && alpha && beta) {
    const distances = [r, alpha, beta].map((part) =>
      squares({ lowest: part.lowest - 1, highest: part.highest - 1 }),
    );
    const implied = {
      lowest: 1 - root(distances.reduce((sum, { highest }) => sum + highest, 0)),
      highest: 1 - root(distances.reduce((sum, { lowest }) => sum + lowest, 0)),
    };
    if (apart(kge, implied))
      broken.push({ identity: 'KGE of its parts', scores: ['kge', 'r', 'alpha', 'beta'] });
  }
  return broken;
}

const rounding = 1e-12;
const limits = [
  { score: 'nse', lowest: Number.NEGATIVE_INFINITY, highest: 1 },
  { score: 'kge', lowest: Number.NEGATIVE_INFINITY, highest: 1 },
  { score: 'rsr', lowest: 0, highest: Number.POSITIVE_INFINITY },
  { score: 'alpha', lowest: 0, highest: Number.POSITIVE_INFINITY },
  { score: 'r', lowest: -1, highest: 1 },
  { score: 'r2', lowest: 0, highest: 1 },
] as const;

function interval(stated: PrintedNumber | undefined): Interval | null {
  return stated ? printedInterval(stated) : null;
}

function apart(one: Interval, other: Interval): boolean {
  const slack = rounding * Math.max(1, Math.abs(one.highest));
  return one.lowest > other.highest + slack || other.lowest > one.highest + slack;
}

function root(value: number): number {
  return Math.sqrt(Math.max(0, value));
}

function squares({ lowest, highest }: Interval): Interval {
  const ends = [lowest ** 2, highest ** 2];
  return { lowest: lowest < 0 && highest > 0 ? 0 : Math.min(...ends), highest: Math.max(...ends) };
}
