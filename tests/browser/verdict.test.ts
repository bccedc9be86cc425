import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot } from '../setup/browser.ts';
import { signIn } from '../setup/sign-in.ts';

const at = withAppInBrowser();

async function countPages(page: Page, format: 'A4' | 'Letter'): Promise<number> {
  const pdf = (await page.pdf({ format, preferCSSPageSize: true })).toString('latin1');
  return pdf.match(/\/Type \/Page\n/g)?.length ?? 0;
}

/** Opens a page and reads it down to its end: what needs a script wakes when it comes into view. */
async function openWhole(page: Page, address: string): Promise<void> {
  await page.goto(address, { waitUntil: 'load' });
  await page.evaluate(async () => {
    for (let y = 0; y < document.documentElement.scrollHeight; y += 400) {
      window.scrollTo(0, y);
      await new Promise((resolve) => setTimeout(resolve, 30));
    }
  });
  await page.waitForFunction(() => document.querySelector('astro-island[ssr]') === null);
}

/** The page as it stands, for eyes and ears, wide and narrow. */
async function look(page: Page, name: string): Promise<void> {
  for (const [width, colorScheme] of [
    [1280, 'light'],
    [360, 'dark'],
  ] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.setViewportSize({ width, height: 800 });
    expect(await findAccessFaults(page), `${name}, ${width} px`).toEqual([]);
    const sticksOut = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(sticksOut, `${name}, ${width} px`).toBeLessThanOrEqual(0);
    await takeShot(page, `verdict-${name}-${width}-${colorScheme}`);
  }
  await page.emulateMedia({ colorScheme: 'light' });
  await page.setViewportSize({ width: 1280, height: 800 });
}

describe('a verdict', () => {
  it('is read, shared and printed, its next trial begun, and its settings taken over', async () => {
    const { page, complaints, close } = await openPage(at.browser);
    await signIn(page, at.running.url, 'supervisor');
    await page.goto(`${at.running.url}/trials`);
    const path = (await page.locator('a[href$="/verdict"]').first().getAttribute('href')) ?? '';
    const open = (part = 'verdict') => openWhole(page, `${at.running.url}${path.replace(/verdict$/, part)}`);

    await open();
    expect(await page.getByRole('heading', { level: 1 }).textContent()).toMatch(/^Set JAW TEMP to 160/);
    await look(page, 'deciding');

    await page.getByRole('button', { name: 'Make a link' }).click();
    const address = await page.getByLabel('Link to this verdict').inputValue();
    const reader = await openPage(at.browser);
    expect((await reader.page.goto(address))?.status()).toBe(200);
    expect(await reader.page.locator('main').textContent()).not.toMatch(/Dana|Lee|ext \d/);
    await look(reader.page, 'shared');
    await page.getByRole('button', { name: /^End this link/ }).click();
    await page.getByRole('button', { name: /^End this link/ }).waitFor({ state: 'detached' });
    expect((await reader.page.goto(address))?.status()).toBe(410);
    await reader.close();

    await open('report');
    for (const format of ['A4', 'Letter'] as const) expect(await countPages(page, format)).toBe(1);

    await open();
    await page.getByRole('button', { name: 'Next trial: move the range' }).click();
    await page.waitForURL(/\/settings$/);
    await page.getByText('This trial follows').waitFor();
    const high = page.getByLabel('High', { exact: true }).first();
    await expect.poll(() => high.inputValue(), { timeout: 10_000 }).toBe('165');

    await open();
    await page.getByRole('radio', { name: /^Use unchecked/ }).check();
    await page.getByRole('button', { name: 'Decide' }).click();
    await page.getByText('Please give a reason.').waitFor();
    await page.getByLabel('Why without check runs?').fill('An urgent order');
    await page.getByRole('button', { name: 'Decide' }).click();
    await page.getByText('Do the new settings hold?').waitFor();
    await look(page, 'closed');

    await page.goto(`${at.running.url}/trials/machine?name=Line%203`);
    expect(await page.getByRole('region', { name: 'Settings in use' }).textContent()).toContain('160 °C');
    await look(page, 'machine');
    expect(complaints).toEqual([]);
    await close();
  });
});
