import { rule } from '../rule.ts';
import { isStated } from '../stand-in.ts';
import { spatialUnits, topics } from './topics.ts';

export const setupChoiceMissing = rule({
  id: 'setup.choice-missing',
  scope: 'setup',
  from: 'calibration',
  means: 'incomplete',
  statement:
    'Spatial units with their thresholds, evapotranspiration, runoff generation and routing are not all stated.',
  why: 'These four choices shape the hydrograph as much as the parameters do; without them the model can’t be set up again, not even by its author.',
  source: { basis: 'practice', citation: 'Common practice in describing a model’s set-up.' },
  clear:
    'Add the topic to setup.choices with what was chosen and why; `default: true` where the model’s own default was left.',
  check: ({ id, fragment: { choices = [] } }) => {
    const about = { record: id, field: ['setup', 'choices'] };
    const missing = topics.filter(
      ({ words }) => !choices.some(({ topic, chosen }) => words.test(topic ?? '') && isStated(chosen)),
    );
    return [
      ...missing.map(({ name }) => ({
        ...about,
        subject: name,
        message: `The set-up does not say what was chosen for ${name}.`,
      })),
      ...choices.flatMap(({ topic, chosen, thresholds }, index) => {
        const divides = spatialUnits.words.test(topic ?? '') && isStated(chosen) && !undivided.test(chosen);
        if (!divides || Object.keys(thresholds ?? {}).length > 0) return [];
        return {
          ...about,
          field: [...about.field, index],
          subject: 'thresholds',
          message: `Nothing says by which thresholds the spatial units (${chosen}) were drawn: least area, bounds of height, size of a cell.`,
          clear: 'Add `thresholds` to the choice, such as {least_area_km2: 2}.',
        };
      }),
    ];
  },
});

/** A catchment in one piece has no thresholds. */
const undivided = /lumped|\b(?:one|single) (?:spatial )?unit\b|whole catchment/i;
