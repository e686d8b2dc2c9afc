import { expect, it } from 'vitest';
import { sealStale } from '../../src/rules/seal/stale.ts';
import { ruleCases } from './rule-cases.ts';

it('refuses a rule that is tested one way only', () => {
  const one = { name: 'a study' };
  expect(() => ruleCases(sealStale, { fires: [], silent: [one] })).toThrow('cases of both kinds');
  expect(() => ruleCases(sealStale, { fires: [{ ...one, finds: {} }], silent: [] })).toThrow(
    'cases of both kinds',
  );
});
