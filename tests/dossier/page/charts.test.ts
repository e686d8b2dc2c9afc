import { describe, expect, it } from 'vitest';
import { barsOverTime } from '../../../src/dossier/charts/bars-over-time.ts';
import { element, escaped, shortened } from '../../../src/dossier/charts/markup.ts';
import { rangeStrip } from '../../../src/dossier/charts/range-strip.ts';
import { linear, logarithmic, overDays } from '../../../src/dossier/charts/scales.ts';
import { areaPath, linePath, type Thinning } from '../../../src/dossier/charts/thin.ts';
import { inText } from '../../../src/dossier/page/to-markdown.ts';
import { dayNumber } from '../../../src/series/calendar.ts';

/** One unit of the drawing for each unit of x and y, so that a path can be read. */
const plain = Object.assign((value: number) => value, { ticks: [] });
const how = (columns: number, to: number): Thinning => ({
  xScale: plain,
  yScale: plain,
  plot: { from: 0, to },
  columns,
  longestStep: 1,
});
const steps = (count: number) => Array.from({ length: count }, (_, place) => place);

/** Every level that a path visits. */
const levels = (path: string) => [...path.matchAll(/[ V](-?[\d.]+)/g)].map(([, level]) => Number(level));

describe('thinning', () => {
  it('keeps the highest and the lowest value of every column, and little more', () => {
    const x = steps(36_500);
    const y = x.map((place) => (place === 20_001 ? 999 : place === 20_003 ? -7 : place % 5));
    const path = linePath({ x, y }, how(100, 36_500));
    expect(levels(path)).toContain(999);
    expect(levels(path)).toContain(-7);
    expect(levels(path).length).toBeLessThanOrEqual(400);
    // A column is 365 wide: the peak stands in the 55th, in its middle.
    expect(path).toMatch(/L19892\.5 [^L]*V999/);
  });

  it('draws a short line whole, leaves gaps open and shows a lonely value', () => {
    const x = [0, 1, 2, 3, 4, 5, 9];
    const y = [1, 2, Number.NaN, Number.NaN, 5, Number.NaN, 3];
    expect(linePath({ x, y }, how(100, 10))).toBe('M0 1L1 2M4 5h0M9 3h0');
    expect(linePath({ x: [], y: [] }, how(100, 10))).toBe('');
  });

  it('leaves a gap of a long line open where a column is narrower than it', () => {
    const x = steps(1000);
    const y = x.map((place) => (place >= 400 && place < 450 ? Number.NaN : 1));
    expect(linePath({ x, y }, how(100, 1000)).match(/M/g)).toHaveLength(2);
    expect(linePath({ x, y }, how(10, 1000)).match(/M/g)).toHaveLength(1);
  });

  it('draws a band as wide as it gets in each column', () => {
    const area = areaPath([0, 1, 2, 3], { lower: [1, 0, 2, Number.NaN], upper: [3, 4, 5, 6] }, how(2, 4));
    expect(area).toBe('M0 4H2L2 5H4L4 2H2L2 0H0z');
  });
});

describe('axes', () => {
  const range = { from: 0, to: 100 };
  it('stand at round numbers, tens and years', () => {
    const texts = (scale: { ticks: readonly { text: string }[] }) => scale.ticks.map(({ text }) => text);
    expect(texts(linear({ from: 0, to: 9700 }, range))).toEqual([
      '0',
      '2 000',
      '4 000',
      '6 000',
      '8 000',
      '10 000',
    ]);
    expect(texts(logarithmic({ from: 0.02, to: 300 }, range))).toEqual([
      '0.01',
      '0.1',
      '1',
      '10',
      '100',
      '1 000',
    ]);
    const years = { from: dayNumber(1901, 5, 1), to: dayNumber(2000, 5, 1) };
    expect(texts(overDays(years, range))).toEqual(['1920', '1940', '1960', '1980', '2000']);
    const months = { from: dayNumber(2007, 10, 1), to: dayNumber(2008, 9, 30) };
    expect(texts(overDays(months, range))).toEqual(['2007-10', '2008-01', '2008-04', '2008-07']);
  });

  it('have width even where all values are one', () => {
    for (const scale of [
      linear({ from: 0, to: 0 }, range),
      linear({ from: 5, to: 5 }, range),
      logarithmic({ from: 5, to: 5 }, range),
    ])
      expect(Number.isFinite(scale(5))).toBe(true);
  });
});

describe('texts of strangers', () => {
  it('are escaped, and unprintable characters shown', () => {
    expect(escaped('<a href="x">\'&\u0007\u202e\ud800')).toBe(
      '&lt;a href=&quot;x&quot;&gt;&#39;&amp;\\u{7}\\u{202e}\ufffd',
    );
    expect(escaped('two\r\nlines\tand more')).toBe('two lines and more');
    expect(element('path', { class: '"><script>', x: 1.26 })).toBe(
      '<path class="&quot;&gt;&lt;script&gt;" x="1.3"/>',
    );
    expect(shortened('降水量の観測', 4)).toBe('降水量…');
  });

  it('start nothing in Markdown', () => {
    expect(inText('*a* _b_ `c` [d](e) | <f> &g; #1 @h $i$')).toBe(
      '\\*a\\* \\_b\\_ \\`c\\` \\[d\\](e) \\| &lt;f&gt; &amp;g; \\#1 \\@h \\$i\\$',
    );
    expect(inText('https://www.northmere.example')).not.toMatch(/https:\/\/|www\.n/);
  });
});

describe('small drawings', () => {
  it('say where a value lies in its range, outside too', () => {
    expect(rangeStrip({ lower: 50, upper: 400, position: 0.35, began: null }).text).toBe('35 %');
    expect(rangeStrip({ lower: 0, upper: 1, position: 1.5, began: 0.5 }).svg).toContain('lozenge outside');
  });

  it('draw gaps that fall on one spot once', () => {
    const gaps = steps(1000).map((day) => ({ from: 10_000 + day * 2, to: 10_001 + day * 2 }));
    const drawn = barsOverTime(
      [{ name: 'rain', mark: 'bar', stretches: [{ from: 9000, to: 40_000 }], gaps }],
      {
        title: 't',
        summary: 's',
        source: 'o',
        legend: [],
      },
    );
    const path = /class="gap" d="([^"]*)"/.exec(drawn?.svg ?? '')?.[1] ?? '';
    expect(path.match(/M/g)?.length).toBeLessThan(60);
  });
});
