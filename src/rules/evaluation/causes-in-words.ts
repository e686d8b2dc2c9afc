import type { Cause } from '../../facts/scores/causes.ts';
import { scoreNames } from './score-names.ts';

/** What a stated score would be, as the end of a sentence: the mix-ups that give just that figure. */
export function causesInWords(causes: readonly Cause[]): string {
  const [last, ...others] = causes.map(inWords).reverse();
  if (last === undefined) return '';
  return others.length === 0 ? last : `${others.reverse().join(', or ')}, or ${last}`;
}

function inWords(cause: Cause): string {
  switch (cause.is) {
    case 'sign-reversed':
      return 'the recomputed figure with its sign reversed';
    case 'other-score':
      return `the ${scoreNames[cause.score]} of the same pairs`;
    case 'sample-deviation':
      return 'what comes out when the sample’s standard deviation (n - 1) is divided by';
    case 'swapped-sides':
      return 'what comes out with observed and simulated swapped';
    case 'warm-up-inside':
      return 'what comes out with the warm-up left inside';
    case 'other-window':
      return `the figure of the ${cause.window} window`;
    case 'both-windows':
      return 'the figure of calibration and validation together';
    case 'whole-simulation':
      return 'the figure of the whole simulation, warm-up and all';
    case 'other-step':
      return `the figure of ${cause.step} values`;
    case 'other-day':
      return `what comes out with the simulated series moved a day ${cause.days > 0 ? 'later' : 'earlier'}, as if one of the two were dated a day off`;
    case 'one-unit':
      return `what comes out when the simulated values are taken to be in ${cause.unit} like the observed ones, as if one of the two units were wrong`;
    case 'incomplete-counted':
      return 'what comes out when months or years with days missing are counted too';
  }
}
