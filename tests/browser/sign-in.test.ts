import type { Knex } from 'knex';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoSignIns } from '../../src/server/demo-sign-ins.ts';
import { findPersonOf, openAppDatabase, plantLink } from '../setup/app-database.ts';
import { findAccessFaults, launchBrowser, openPage, takeShot } from '../setup/browser.ts';
import { type RunningApp, startApp } from '../setup/running-app.ts';

const [dana, sam] = demoSignIns;
let running: RunningApp;
let browser: Browser;
let db: Knex;
beforeAll(async () => {
  running = await startApp();
  db = openAppDatabase(running);
  browser = await launchBrowser();
}, 120_000);
afterAll(async () => {
  await browser?.close();
  await db?.destroy();
  await running?.stop();
});

const looks = [
  { name: 'desk-light-en', viewport: { width: 1280, height: 800 }, colorScheme: 'light', locale: 'en' },
  { name: 'phone-dark-pl', viewport: { width: 360, height: 740 }, colorScheme: 'dark', locale: 'pl' },
] as const;

describe.each(looks)('the pages to get in, $name', ({ name, ...options }) => {
  it('can be used by everybody and fit the screen', async () => {
    const { id, shopId } = await findPersonOf(db, dana.email);
    const links = await Promise.all(
      (['invite', 'reset', 'setup'] as const).map(async (purpose) => [
        purpose,
        `/${purpose}/${await plantLink(db, { purpose, shopId, personId: id })}`,
      ]),
    );
    const { page, complaints, close } = await openPage(browser, options);
    const paths = [
      ['sign-in', '/sign-in'],
      ['reset-ask', '/reset'],
      ['reset-sent', '/reset?sent=1'],
      ['dead', '/invite/dead'],
      ...links,
    ];
    for (const [what = '', path = ''] of paths) {
      await page.goto(running.url + path);
      await takeShot(page, `${what}-${name}`);
      expect(await findAccessFaults(page), what).toEqual([]);
      const isTooWide = await page.evaluate(() => document.documentElement.scrollWidth > innerWidth);
      expect(isTooWide, what).toBe(false);
    }
    await page.goto(`${running.url}/sign-in`);
    await page.fill('#email', sam.email);
    await page.fill('#password', 'wrong');
    await page.keyboard.press('Enter');
    await page.waitForSelector('.callout-stop');
    expect(await page.inputValue('#email')).toBe(sam.email);
    expect(await findAccessFaults(page)).toEqual([]);
    await page.fill('#password', sam.password);
    await page.keyboard.press('Enter');
    await page.waitForURL('**/trials');
    await page.goto(`${running.url}/me`);
    await takeShot(page, `me-${name}`);
    expect(await findAccessFaults(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });
});

describe('signing in without scripts', () => {
  it('works from the demo button to signing out', async () => {
    const { page, close } = await openPage(browser, { javaScriptEnabled: false });
    await page.goto(`${running.url}/me`);
    await page.click(`form:has(input[value="${sam.email}"]) button`);
    await page.waitForURL('**/me');
    await page.selectOption('#theme', 'dark');
    await page.click('button[value="settings"]');
    expect(await page.getAttribute('html', 'data-theme')).toBe('dark');
    expect(await page.textContent('.callout-good')).toContain('Saved.');
    await page.goto(`${running.url}/sign-out`);
    await page.click('main button');
    await page.goto(`${running.url}/me`);
    expect(new URL(page.url()).pathname).toBe('/sign-in');
    await close();
  });
});

describe('the set-up form', () => {
  it('proposes the zone of the browser, and shows a password only when asked', async () => {
    const { shopId } = await findPersonOf(db, dana.email);
    const token = await plantLink(db, { purpose: 'setup', shopId });
    const { page, close } = await openPage(browser, { timezoneId: 'America/Chicago' });
    await page.goto(`${running.url}/setup/${token}`);
    expect(await page.inputValue('#timeZone')).toBe('America/Chicago');
    expect(await page.getAttribute('#password', 'type')).toBe('password');
    await page.getByLabel('Show the password').check();
    expect(await page.getAttribute('#password', 'type')).toBe('text');
    await close();
  });
});
