import { rule } from '../rule.ts';

export const studyLiteratureMissing = rule({
  id: 'study.literature-missing',
  scope: 'study',
  from: 'validation',
  means: 'incomplete',
  statement: 'No earlier work on the catchment or region is listed, nor where it was sought in vain.',
  why: 'Earlier gauging, recession analyses and models of the same rocks and soils bound what parameters and flows are believable. A study that has not looked can repeat a known mistake.',
  source: {
    basis: 'practice',
    citation: 'Common practice: earlier work is reviewed before a model is calibrated.',
  },
  clear:
    'List it in `study.literature` with what it gives, or write `none_found: {sought_in: [...], on: ...}`.',
  check({ id, fragment: { literature } }) {
    const missing = (message: string) => [{ record: id, field: ['study', 'literature'], message }];
    if (literature === undefined || (Array.isArray(literature) && literature.length === 0)) {
      return missing('No earlier work on this catchment or region is listed, nor that none was found.');
    }
    if (Array.isArray(literature)) return [];
    const { sought_in, on } = literature.none_found;
    return sought_in === undefined || sought_in.length === 0 || on === undefined
      ? missing('It is said that no earlier work was found, but not where and when it was sought.')
      : [];
  },
});
