import { afterEach, expect, it, vi } from 'vitest';
import { outside, outsidePackage } from './outside.ts';

afterEach(() => {
  vi.unstubAllEnvs();
});

it('finds a tool that is here', () => {
  expect(outside('git')).toEqual({ available: true, reason: '' });
});

it('says why a tool cannot be used, or fails where it is asked for', () => {
  vi.stubEnv('STOPLOG_REQUIRE_OUTSIDE', undefined);
  expect(outside('no-such-tool')).toMatchObject({
    available: false,
    reason: expect.stringContaining('no-such-tool'),
  });
  expect(outside('git', ['no-such-command']).available).toBe(false);
  vi.stubEnv('STOPLOG_REQUIRE_OUTSIDE', '1');
  expect(() => outside('no-such-tool')).toThrow(/no-such-tool could not be started/);
});

it('finds a package of tests/validators, or says that it is not there', () => {
  vi.stubEnv('STOPLOG_REQUIRE_OUTSIDE', undefined);
  expect(outsidePackage('no-such-package')).toMatchObject({
    available: false,
    reason: 'the package no-such-package is not installed in tests/validators',
  });
  vi.stubEnv('STOPLOG_REQUIRE_OUTSIDE', '1');
  expect(() => outsidePackage('no-such-package')).toThrow(/no-such-package is not installed/);
});
