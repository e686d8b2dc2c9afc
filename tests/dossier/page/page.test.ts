import { spawnSync } from 'node:child_process';
import { mkdtemp, readFile, realpath, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { pageDocuments } from '../../../src/dossier/page/index.ts';
import { outside } from '../../harness/outside.ts';
import { axeScript, type BrowserPage, chromium, inChromium, type Opened } from './chromium.ts';
import { exampleRepository, withContent } from './content.ts';
import { hostileManifest, hostileTexts } from './hostile.ts';

const poppler = outside('pdftotext', ['-v']);

interface Made {
  readonly html: string;
  readonly markdown: string;
  /** Where the HTML lies. */
  readonly file: string;
}

let folder: string;
let sound: Made;
let hostile: Made;

async function made(name: string, edit: (manifest: string) => string): Promise<Made> {
  const repository = await exampleRepository(edit);
  try {
    const texts = await withContent(repository, async (content) => {
      const documents = await pageDocuments(content);
      expect(await pageDocuments(content)).toEqual(documents);
      return documents.map((document) => String(document.content));
    });
    const [html = '', markdown = ''] = texts;
    const file = join(folder, `${name}.html`);
    await writeFile(file, html);
    return { html, markdown, file };
  } finally {
    await repository.remove();
  }
}

beforeAll(async () => {
  folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-test-')));
  sound = await made('sound', (manifest) => manifest);
  hostile = await made('hostile', hostileManifest);
}, 120_000);
afterAll(() => rm(folder, { recursive: true }));

describe('the page', () => {
  it('answers first what was modelled, whether the records hold, and what the caution is', () => {
    for (const text of [sound.markdown, sound.html.replace(/<[^>]+>/g, '')]) {
      const opening = text.slice(0, text.indexOf('Decision it serves'));
      for (const said of [
        'Fennock Water low-flow model',
        'Daily streamflow at Old Mill in dry summers.',
        'two-store 1.4.2',
        'The records hold.',
        'local regulations and licensed practice decide',
      ])
        expect(opening).toContain(said);
      expect(opening).not.toContain('DRAFT');
    }
  });

  it('says the same in HTML and in Markdown', () => {
    const words = (text: string) => text.replace(/[^\p{L}\p{N}]+/gu, ' ');
    const inMarkdown = words(
      sound.markdown.replaceAll('&amp;', '&').replaceAll('&lt;', '<').replaceAll('&gt;', '>'),
    );
    const cells = [...sound.html.matchAll(/<(td|dd|h[1-4]|figcaption)[^>]*>([^<]+)<\/\1>/g)].map(
      ([, , text = '']) =>
        words(text.replaceAll('&nbsp;', ' ').replace(/&#39;|&quot;|&amp;|&lt;|&gt;/g, ' ')).trim(),
    );
    expect(cells.length).toBeGreaterThan(200);
    expect(cells.filter((cell) => !inMarkdown.includes(cell))).toEqual([]);
  });

  it('shows stated and recomputed scores with their class', () => {
    // Scores of the example are recomputed by tests/example-project.test.ts; classes by Moriasi et al. 2015: NSE above 0.80 very good.
    expect(sound.markdown).toContain('| calibration | NSE | 0.83 | 0.834 | yes | very good |');
    expect(sound.markdown).toContain('Classes by moriasi-2015-daily-flow');
  });

  it('takes a stranger’s text for text', () => {
    expect(hostile.html).not.toMatch(/<script|<img|onerror="/);
    expect(hostile.html).toContain('&lt;script&gt;document.title');
    expect(hostile.html).not.toContain('\u001b');
    expect(hostile.html.replaceAll('<wbr>', '')).toContain('a\\u{1b}[31mb\\u{202e}c\\u{0}d\\u{85}e');
    const { markdown } = hostile;
    expect(markdown).not.toMatch(/<[a-z!/]/);
    expect(markdown).not.toMatch(/(^|[^\\])\[click/);
    expect(markdown).not.toMatch(/https?:\/\/www/);
    expect(markdown).not.toMatch(/^# no heading|^- no list/m);
    expect(markdown).toContain('a \\| b \\`c\\` \\*\\*d\\*\\* \\_e\\_ &lt;!-- f --&gt; &amp;lt;g&amp;gt;');
  });
});

const browserIt = it.skipIf(!chromium.available);
const why = chromium.available ? '' : ` (${chromium.reason})`;

interface Fault {
  readonly id: string;
  readonly impact: string;
  readonly nodes: readonly { readonly html: string; readonly failureSummary: string }[];
}

/** Faults that are more than minor; in the dark only what colours can do, since nothing else changes. */
async function barriers(page: BrowserPage, colorScheme: 'light' | 'dark'): Promise<readonly string[]> {
  await page.emulateMedia({ colorScheme });
  const rules = colorScheme === 'dark' ? "{ runOnly: ['color-contrast'] }" : '{}';
  await page.evaluate(await readFile(axeScript, 'utf8'));
  const faults = await page.evaluate<readonly Fault[]>(
    `axe.run(${rules}).then(({ violations }) => violations)`,
  );
  return faults
    .filter(({ impact }) => impact === 'serious' || impact === 'critical' || impact === 'moderate')
    .map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 200)} ${nodes[0]?.failureSummary}`);
}

const widerThanScreen = `[...document.querySelectorAll('body *')]
  .filter((one) => !one.closest('svg') && !one.closest('thead') && one.getBoundingClientRect().right > innerWidth + 1)
  .map((one) => one.outerHTML.slice(0, 120))`;

/** Texts of drawings that leave their drawing. */
const cutTexts = `[...document.querySelectorAll('svg.chart text')].flatMap((text) => {
  const [box, around] = [text.getBoundingClientRect(), text.closest('svg').getBoundingClientRect()];
  const isInside = box.left >= around.left - 1 && box.right <= around.right + 1 && box.top >= around.top - 1 && box.bottom <= around.bottom + 1;
  return isInside ? [] : [text.textContent];
})`;

/** Texts of one drawing that lie over each other. */
const overlaps = `[...document.querySelectorAll('svg.chart')].flatMap((svg) => {
  const boxes = [...svg.querySelectorAll('text')].map((text) => ({ text, box: text.getBoundingClientRect() }));
  return boxes.flatMap(({ text, box }, place) => boxes.slice(place + 1)
    .filter(({ box: other }) => box.left < other.right - 1 && other.left < box.right - 1 && box.top < other.bottom - 3 && other.top < box.bottom - 3)
    .map(({ text: other }) => text.textContent + ' / ' + other.textContent));
})`;

describe.each(['sound', 'hostile'])('in a browser: %s', (name) => {
  const open = <Result>(use: (opened: Opened) => Promise<Result>) =>
    inChromium((name === 'sound' ? sound : hostile).file, use);

  browserIt(
    `says nothing on the console, asks for nothing, runs nothing${why}`,
    () =>
      open(async ({ page, said, asked }) => {
        expect(said).toEqual([]);
        expect(asked).toEqual([]);
        expect(await page.evaluate('document.title')).not.toBe('taken');
        expect(await page.evaluate('document.scripts.length')).toBe(0);
        if (name === 'hostile') {
          const text = await page.evaluate<string>('document.body.textContent');
          for (const hostileText of Object.values(hostileTexts))
            expect(text.replaceAll('\u00a0', ' ')).toContain(hostileText);
        }
      }),
    60_000,
  );

  browserIt.each(['light', 'dark'] as const)(
    `has no barrier that axe-core finds, %s${why}`,
    (colorScheme) =>
      open(async ({ page }) => {
        expect(await barriers(page, colorScheme)).toEqual([]);
      }),
    120_000,
  );

  browserIt(
    `fits a screen of 360 pixels and a wide one${why}`,
    () =>
      open(async ({ page }) => {
        for (const width of [360, 1100]) {
          await page.setViewportSize({ width, height: 740 });
          expect(
            await page.evaluate('document.documentElement.scrollWidth'),
            String(width),
          ).toBeLessThanOrEqual(width);
          expect(await page.evaluate(widerThanScreen)).toEqual([]);
        }
      }),
    60_000,
  );

  browserIt(
    `has figures with title, summary, source and text alternatives, nothing cut or overlapping${why}`,
    () =>
      open(async ({ page }) => {
        const lacking = `[...document.querySelectorAll('figure')].filter((figure) => {
          const svg = figure.querySelector('svg[role=img]');
          const texts = ['figcaption', '.summary', '.source', 'svg > title', 'svg > desc'].map((part) => figure.querySelector(part)?.textContent ?? '');
          return svg === null || texts.some((text) => text.trim() === '');
        }).length`;
        expect(await page.evaluate(lacking)).toBe(0);
        expect(await page.evaluate<number>("document.querySelectorAll('figure').length")).toBeGreaterThan(25);
        expect(await page.evaluate(cutTexts)).toEqual([]);
        expect(await page.evaluate(overlaps)).toEqual([]);
      }),
    60_000,
  );

  it.skipIf(!chromium.available || !poppler.available)(
    `prints on A4, a draft marked on every page${why}${poppler.reason}`,
    () =>
      open(async ({ page }) => {
        const pdf = join(folder, `${name}.pdf`);
        await writeFile(pdf, await page.pdf({ preferCSSPageSize: true }));
        const { stdout } = spawnSync('pdftotext', ['-layout', pdf, '-'], {
          encoding: 'utf8',
          maxBuffer: 2 ** 26,
        });
        const pages = stdout.split('\f').slice(0, -1);
        expect(pages.length).toBeGreaterThan(10);
        expect(pages.filter((text) => !text.includes(`/ ${pages.length}`))).toEqual([]);
        expect(pages.filter((text) => text.includes('DRAFT')).length).toBe(
          name === 'hostile' ? pages.length : 0,
        );
        const { stdout: told } = spawnSync('pdfinfo', [pdf], { encoding: 'utf8' });
        expect(told).toMatch(/Page size: +59[45]\.\d+ x 84[12]\.\d+ pts \(A4\)/);
      }),
    60_000,
  );
});
