import { execFileSync } from 'node:child_process';
import { mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { type Browser, type BrowserContextOptions, chromium, type Page } from 'playwright-core';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const shotsFolder = fileURLToPath(new URL('../../shots/', import.meta.url));

/** Flags that keep Chromium from calling home, and let it run as root in a container. */
const flags = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export function launchBrowser(): Promise<Browser> {
  const executablePath = execFileSync('sh', ['-c', 'command -v chromium || command -v chromium-browser'], {
    encoding: 'utf8',
  }).trim();
  return chromium.launch({ executablePath, args: flags });
}

/** A page with its complaints: errors in the console, thrown errors, and violations of the content policy. */
export interface WatchedPage {
  page: Page;
  complaints: string[];
  close(): Promise<void>;
}

/** Opens a page of its own cookies. Answers of 4xx are the test's business; the console's line about them is left out. */
export async function openPage(browser: Browser, options: BrowserContextOptions = {}): Promise<WatchedPage> {
  const context = await browser.newContext({
    viewport: { width: 1280, height: 800 },
    locale: 'en',
    ...options,
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('console', (message) => {
    const isRefusedAnswer = message
      .text()
      .startsWith('Failed to load resource: the server responded with a status');
    if (message.type() === 'error' && !isRefusedAnswer) complaints.push(message.text());
  });
  return { page, complaints, close: () => context.close() };
}

/**
 * What axe finds on the page as it stands, one line a rule and place.
 * @param rules only these, such as `color-contrast` where nothing but the colours has changed since the last look
 */
export async function findAccessFaults(page: Page, rules: string[] | null = null): Promise<string[]> {
  // Reading the rules in takes longer than a look at most pages, so each document reads them once.
  if (!(await page.evaluate(() => 'axe' in globalThis))) await page.evaluate(axeSource);
  return page.evaluate(async (only) => {
    const { axe } = globalThis as unknown as { axe: typeof import('axe-core') };
    const { violations } = await axe.run({
      resultTypes: ['violations'],
      ...(only ? { runOnly: only } : {}),
    });
    return violations.flatMap(({ id, nodes }) => nodes.map((node) => `${id}: ${node.target.join(' ')}`));
  }, rules);
}

/**
 * Opens an address and waits until its islands are awake, save those that only wake once somebody scrolls to them. Answers the status.
 */
export async function openAwake(page: Page, address: string): Promise<number | undefined> {
  const answer = await page.goto(address, { waitUntil: 'load' });
  await page.waitForFunction(
    () => document.querySelector('astro-island[ssr]:not([client="visible"])') === null,
  );
  return answer?.status();
}

/** Saves the whole page as a picture in `shots/`, to be looked at; only where somebody asks for it with `SHOTS=yes`. */
export async function takeShot(page: Page, name: string): Promise<void> {
  if (process.env['SHOTS'] !== 'yes') return;
  mkdirSync(shotsFolder, { recursive: true });
  await page.screenshot({ path: `${shotsFolder}${name}.png`, fullPage: true });
}
