import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';
import { startApp } from '../setup/running-app.ts';

const at = withAppInBrowser();

const widths = [
  { width: 1280, height: 800 },
  { width: 768, height: 1024 },
  { width: 360, height: 740 },
];

/** Controls lower than a finger, by their words. The whole of a tag and of a choice is their target. */
function findSmallTargets(page: Page): Promise<string[]> {
  return page.evaluate(() => {
    const controls = document.querySelectorAll<HTMLElement>(
      '.button, .input, .choice, .menu-item, .frame-nav-link, .section-tab, .step-inside, .table-sort, .head-menu > summary, .disclosure > summary, .slider-input',
    );
    return Array.from(controls)
      .filter((control) => control.checkVisibility() && control.getBoundingClientRect().height < 47.5)
      .map((control) => `${control.className}: ${control.textContent}`);
  });
}

const sheets = [
  { path: '/pieces', theme: 'light' },
  { path: '/pieces', theme: 'dark' },
  { path: '/pieces/question', theme: 'light' },
  { path: '/pieces/question', theme: 'dark' },
];

describe.each(sheets)('$path in the $theme theme', ({ path, theme }) => {
  let opened: WatchedPage;
  beforeAll(async () => {
    opened = await openPage(at.browser);
    await opened.page.goto(`${at.running.url}${path}?theme=${theme}`, { waitUntil: 'networkidle' });
    await opened.page.evaluate(() => document.fonts.ready);
  });
  afterAll(() => opened.close());

  it('have no style attribute, which the content policy would block, and no complaint', async () => {
    expect(await opened.page.locator('[style]').count()).toBe(0);
    expect(opened.complaints).toEqual([]);
  });

  it.each(widths)('have no fault at $width px', async (viewport) => {
    const { page } = opened;
    await page.setViewportSize(viewport);
    await takeShot(page, `${path.slice(1).replace('/', '-')}-${viewport.width}-${theme}`);
    expect(await findAccessFaults(page)).toEqual([]);
    expect(await findSmallTargets(page)).toEqual([]);
    expect(
      await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth),
    ).toBeLessThanOrEqual(0);
  });
});

describe('the theme', () => {
  const backgroundOf = (page: Page) =>
    page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);

  it.each([
    ['light', '', 'rgb(238, 241, 238)'],
    ['dark', '', 'rgb(17, 24, 29)'],
    ['dark', '?theme=light', 'rgb(238, 241, 238)'],
    ['light', '?theme=dark', 'rgb(17, 24, 29)'],
  ] as const)('on a %s device with "%s" has the bench %s', async (colorScheme, query, bench) => {
    const { page, close } = await openPage(at.browser, { colorScheme });
    await page.goto(`${at.running.url}/pieces${query}`);
    expect(await backgroundOf(page)).toBe(bench);
    await close();
  });

  it('is light on paper, whatever it is on the screen', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces?theme=dark`);
    await page.emulateMedia({ media: 'print', colorScheme: 'dark' });
    expect(await page.evaluate(() => getComputedStyle(document.body).color)).toBe('rgb(22, 33, 43)');
    await close();
  });
});

describe('by keyboard', () => {
  it('the skip link comes first and leads to the page', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces`);
    await page.keyboard.press('Tab');
    await page.keyboard.press('Enter');
    expect(await page.evaluate(() => document.activeElement?.id)).toBe('main');
    await close();
  });

  it('a menu opens, and Escape closes it and stays there', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces`);
    const menu = page.locator('.head-menu').first();
    await menu.locator('summary').focus();
    await page.keyboard.press('Enter');
    expect(await menu.getAttribute('open')).not.toBeNull();
    await page.keyboard.press('Tab');
    await page.keyboard.press('Escape');
    expect(await menu.getAttribute('open')).toBeNull();
    expect(await page.evaluate(() => document.activeElement?.tagName)).toBe('SUMMARY');
    await close();
  });

  it('a dialog keeps the focus, starts on the harmless answer and gives the focus back', async () => {
    const { page, complaints, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces`, { waitUntil: 'networkidle' });
    await page.getByRole('button', { name: 'End the trial early' }).press('Enter');
    const focused = () => page.evaluate(() => document.activeElement?.textContent);
    expect(await focused()).toBe('Keep it running');
    expect(await findAccessFaults(page)).toEqual([]);
    await page.keyboard.press('Escape');
    expect(await page.locator('dialog[open]').count()).toBe(0);
    expect(await focused()).toBe('End the trial early');
    expect(complaints).toEqual([]);
    await close();
  });

  it('a wide table scrolls by arrow keys on a phone', async () => {
    const { page, close } = await openPage(at.browser, { viewport: { width: 360, height: 740 } });
    await page.goto(`${at.running.url}/pieces`);
    const table = page.getByRole('region', { name: 'Runs so far' });
    await table.focus();
    for (let press = 0; press < 5; press += 1) await page.keyboard.press('ArrowRight');
    await expect.poll(() => table.evaluate((element) => element.scrollLeft)).toBeGreaterThan(0);
    await close();
  });
});

describe('a tag', () => {
  it('is 200 x 194 with four settings, and a row of 72 on a phone', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces`);
    expect(await page.locator('.job-tag').first().boundingBox()).toMatchObject({ width: 200, height: 194 });
    await page.setViewportSize({ width: 360, height: 740 });
    expect(await page.locator('.job-tag').first().boundingBox()).toMatchObject({ width: 328, height: 72 });
    await close();
  });

  it('never shortens a figure', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces`);
    for (const viewport of widths) {
      await page.setViewportSize(viewport);
      const cut = await page
        .locator('.job-tag-value:not(.job-tag-choice) .job-tag-figure')
        .evaluateAll((figures) => figures.filter((figure) => figure.scrollWidth > figure.clientWidth).length);
      expect(cut).toBe(0);
    }
    await close();
  });
});

describe('for real', () => {
  it('the pages for developers do not exist', async () => {
    const live = await startApp({
      env: {
        APP_MODE: 'live',
        // Without the worker nothing here speaks to a text service.
        ROLE: 'web',
        APP_URL: 'https://trywell.example',
        APP_SECRET: 'a-secret-of-the-tests-of-32-letters',
        SMTP_HOST: '127.0.0.1',
        MAIL_FROM: 'Trywell <trywell@trywell.example>',
        CLOCK_OFFSET_FILE: '',
      },
    });
    try {
      for (const path of ['/pieces', '/pieces/question', '/pieces/paper']) {
        expect((await fetch(`${live.url}${path}`)).status).toBe(404);
        expect((await fetch(`${at.running.url}${path}`)).status).toBe(200);
      }
    } finally {
      await live.stop();
    }
  });
});
