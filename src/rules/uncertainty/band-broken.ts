import type { BandFigures } from '../../facts/bands.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { figure } from '../figures.ts';
import { type Draft, rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { whileAway } from '../while-away.ts';

export const uncertaintyBandBroken = rule({
  id: 'uncertainty.band-broken',
  scope: 'uncertainty',
  from: 'calibration',
  means: 'contradicted',
  statement:
    'A band has its lower end above the upper one, no level or unit, no values on days that are observed, or can’t be read beside its target.',
  why: 'Such a band is no statement about what may happen: where it is upside down or missing, nothing that is observed can fall outside.',
  source: {
    basis: 'definition',
    citation: 'Follows from the words: a band has two ends, in that order, on every step, and a probability.',
  },
  clear:
    'Make the band anew over the whole window that it is judged on, and state its level (such as 0.95), its unit and its columns `lower` and `upper`.',
  check: ({ id }, { bands }) =>
    bands.flatMap((band) => faultsOf(band).map((fault) => ({ record: id, field: band.field, ...fault }))),
});

function faultsOf(band: BandFigures): readonly Omit<Draft, 'record'>[] {
  const { target, fragment, field, recomputed, away, over } = band;
  const unstated = [
    ...(fragment.level === undefined ? ['level'] : []),
    ...(isStated(fragment.unit) ? [] : ['unit']),
  ].map((key) => ({
    field: [...field, key],
    subject: `${target} ${key}`,
    message: `The band of ${target} has no ${key}: ${key === 'level' ? 'nobody knows how many observations it is meant to hold' : 'it can’t be held against the observations'}.`,
  }));
  if (!isDefined(recomputed))
    // Without a unit it can't be read, and that is said already.
    return !isStated(fragment.unit)
      ? unstated
      : [
          ...unstated,
          {
            subject: `${target} unread`,
            message: `The band of ${target} can’t be held against its target: ${recomputed.undefined}.`,
            ...(away === null ? {} : whileAway(away)),
          },
        ];
  const { crossed, stated } = recomputed.value;
  const faults: Omit<Draft, 'record'>[] = [...unstated];
  if (crossed.steps > 0)
    faults.push({
      subject: `${target} order`,
      found: crossed.steps,
      message: `The lower end of the band of ${target} lies above the upper one on ${figure(crossed.steps)} steps, first on ${crossed.first}.`,
    });
  if (!isDefined(stated))
    faults.push({
      subject: `${target} window`,
      message: `The band of ${target} can’t be judged over ${over}: ${stated.undefined}.`,
    });
  else if (stated.value.withoutBand > 0)
    faults.push({
      subject: `${target} length`,
      found: stated.value.steps,
      message: `The band of ${target} has no values on ${figure(stated.value.withoutBand)} of the ${figure(stated.value.steps + stated.value.withoutBand)} observed steps of ${over}: it is not as long as the series that it is the band of.`,
    });
  return faults;
}
