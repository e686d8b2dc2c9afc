import { describe, expect, it } from 'vitest';
import { progressLine } from './progress-line.ts';

/** A line over a clock that the test sets, and all that was written. */
function line() {
  const written: string[] = [];
  const clock = { now: 500 };
  return {
    written,
    clock,
    ...progressLine(
      (text) => written.push(text),
      () => clock.now,
    ),
  };
}

describe('the line that shows progress', () => {
  it('is silent about short work, then shows the newest, ten times a second at most', () => {
    const { written, clock, show } = line();
    for (const now of [500, 1499, 1500, 1501, 1599, 1600]) {
      clock.now = now;
      show(`at ${now}`);
    }
    expect(written).toEqual(['\r\u001b[Kat 1500', '\r\u001b[Kat 1600']);
  });

  it('goes before anything else is written, once', () => {
    const { written, clock, show, clear } = line();
    clear();
    expect(written).toEqual([]);
    clock.now = 9000;
    show('reading');
    clear();
    clear();
    expect(written).toEqual(['\r\u001b[Kreading', '\r\u001b[K']);
  });

  it('never wraps', () => {
    const { written, clock, show } = line();
    clock.now = 9000;
    show('x'.repeat(500));
    expect(written[0]).toHaveLength(4 + 78);
  });
});
