import { rule } from '../rule.ts';

export const uncertaintyBandMissing = rule({
  id: 'uncertainty.band-missing',
  scope: 'uncertainty',
  from: 'application',
  means: 'incomplete',
  statement: 'The main target (the first that the purpose needs) has no uncertainty band.',
  why: 'A decision made on one line of simulated flow does not know how far the real flow may lie from it.',
  source: { basis: 'practice', citation: 'Common practice when a simulation supports a decision.' },
  clear: 'Add uncertainty.bands.<target> with the file, its lower and upper columns, level and unit.',
  check: ({ id, fragment }, { manifest }) => {
    const needed = new Set(
      (manifest.data.study?.needs ?? []).map(({ variable }) => variable ?? 'streamflow'),
    );
    const targets = Object.entries(manifest.data.evaluation ?? {}).filter(
      ([, { none_because }]) => none_because === undefined,
    );
    const main =
      targets.find(([, { variable }]) => variable !== undefined && needed.has(variable)) ?? targets[0];
    if (main === undefined || fragment.bands?.[main[0]]?.file !== undefined) return [];
    return [
      {
        record: id,
        field: ['uncertainty', 'bands'],
        subject: main[0],
        message: `No uncertainty band is recorded for the main target, ${main[0]}.`,
      },
    ];
  },
});
