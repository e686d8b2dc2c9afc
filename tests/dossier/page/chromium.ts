import { mkdtemp, realpath, rm } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { type Outside, outside, outsidePackage } from '../../harness/outside.ts';

const executablePath = '/usr/bin/chromium';
const browser = outside(executablePath);
const playwright = outsidePackage('playwright-core');
const axe = outsidePackage('axe-core');

/** A browser, the package that drives it and the one that looks for barriers; all three or none. */
export const chromium: Outside = [browser, playwright, axe].find(({ available }) => !available) ?? browser;

/** As far as the tests use it; the package's own types are not installed with ours. */
export interface BrowserPage {
  goto(url: string): Promise<unknown>;
  evaluate<Result>(script: string): Promise<Result>;
  pdf(options: object): Promise<Buffer>;
  on(event: 'console', listener: (message: { text(): string }) => void): void;
  on(event: 'pageerror', listener: (error: Error) => void): void;
  on(event: 'request', listener: (request: { url(): string }) => void): void;
  emulateMedia(options: { colorScheme: 'light' | 'dark' }): Promise<void>;
  setViewportSize(size: { width: number; height: number }): Promise<void>;
}

interface BrowserContext {
  newPage(): Promise<BrowserPage>;
  close(): Promise<void>;
}

interface Playwright {
  readonly chromium: {
    launchPersistentContext(folder: string, options: object): Promise<BrowserContext>;
  };
}

export interface Opened {
  readonly page: BrowserPage;
  /** What the page said on the console, and what it asked for beside itself. */
  readonly said: readonly string[];
  readonly asked: readonly string[];
}

/** Opens an HTML file in a browser of its own, which is gone afterwards. */
export async function inChromium<Result>(
  file: string,
  use: (opened: Opened) => Promise<Result>,
): Promise<Result> {
  const require = createRequire(join(playwright.folder, 'package.json'));
  const driver = require('playwright-core') as Playwright;
  const folder = await realpath(await mkdtemp(join(tmpdir(), 'stoplog-browser-')));
  const context = await driver.chromium.launchPersistentContext(folder, {
    executablePath,
    viewport: { width: 1100, height: 900 },
    args: [
      '--headless',
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
  try {
    const page = await context.newPage();
    const [said, asked]: [string[], string[]] = [[], []];
    const own = pathToFileURL(file).href;
    page.on('console', (message) => said.push(message.text()));
    page.on('pageerror', (error) => said.push(String(error)));
    page.on('request', (request) => {
      if (request.url() !== own) asked.push(request.url());
    });
    await page.goto(own);
    return await use({ page, said, asked });
  } finally {
    await context.close();
    await rm(folder, { recursive: true, force: true });
  }
}

/** Where axe-core's script lies. */
export const axeScript = join(axe.folder, 'axe.min.js');
