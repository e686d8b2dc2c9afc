import { describe, expect, it } from 'vitest';
import { isDefined, pairInOrder } from '../paired.ts';
import { highFlowBias } from './high-flow-bias.ts';
import { lowFlowBias } from './low-flow-bias.ts';
import { middleSlopeBias } from './middle-slope-bias.ts';

describe('segments of the flow-duration curve', () => {
  it('hold the ranks whose plotting position is exactly their end', () => {
    const flows = Array.from({ length: 99 }, (_, rank) => 1 + rank);
    const paired = pairInOrder({ observed: flows, simulated: flows });
    // 2 / 100 = 0.02 belongs to the high flows; 70 / 100 = 0.70 to the low ones: ranks 70 to 99
    expect(highFlowBias(paired)).toMatchObject({ value: { steps: 2 } });
    expect(lowFlowBias(paired)).toMatchObject({ value: { steps: 30 } });
  });

  it('have reasons where the observations do not vary or flow', () => {
    const simulated = [1, 2, 3, 4, 5];
    const flat = pairInOrder({ observed: [2, 2, 2, 2, 2], simulated });
    const dry = pairInOrder({ observed: [0, 0, 0, 0, 0], simulated });
    const tidal = pairInOrder({ observed: [-1, 2, 2, 3, 4], simulated });
    for (const paired of [flat, dry, tidal, pairInOrder({ observed: [], simulated: [] })]) {
      expect(isDefined(middleSlopeBias(paired))).toBe(false);
      expect(isDefined(lowFlowBias(paired))).toBe(false);
    }
    expect(isDefined(highFlowBias(dry))).toBe(false);
  });
});
