import type { Page } from 'playwright-core';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openAwake, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';
import { signIn } from '../setup/sign-in.ts';
import { withoutDemoTrials } from '../setup/without-demo-trials.ts';

const at = withAppInBrowser();
beforeAll(() => withoutDemoTrials(at.running));

async function openAs(role: 'supervisor' | 'engineer'): Promise<WatchedPage> {
  const watched = await openPage(at.browser);
  await signIn(watched.page, at.running.url, role);
  return watched;
}

function call(page: Page, method: 'PUT' | 'PATCH', path: string, data: object) {
  const options = { method, data, headers: { Origin: at.running.url } };
  return page.request.fetch(`${at.running.url}${path}`, options);
}

/** A draft with a name, as the wizard makes it. */
async function addTrial(page: Page, title: string, machine: string): Promise<string> {
  const id = v7();
  expect((await call(page, 'PUT', `/api/trials/${id}`, {})).ok()).toBe(true);
  const save = { question: 'job', base: 0, content: { title, machine }, save: v7() };
  expect((await call(page, 'PATCH', `/api/trials/${id}/answers`, save)).ok()).toBe(true);
  return id;
}

const titles = (page: Page) => page.locator('#trials-caption ~ tbody th').allTextContents();

/** Opens the menu of a row by keys and picks one of its actions. */
async function pickByKeys(page: Page, row: string, action: string): Promise<void> {
  const line = page.locator('tr', { hasText: row });
  await line.locator('summary').focus();
  await page.keyboard.press('Enter');
  await line.getByRole('button', { name: action }).focus();
  await page.keyboard.press('Enter');
}

describe('the trials', () => {
  it('begin with an empty rack that says what to do, and end in the first question', async () => {
    const { page, complaints, close } = await openAs('supervisor');
    expect(new URL(page.url()).pathname).toBe('/trials');
    await openAwake(page, `${at.running.url}/trials`);
    await page.getByRole('heading', { name: 'No trial yet' }).waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'trials-empty-1280');
    const start = page.getByRole('button', { name: 'Start one' });
    await start.focus();
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/trials\/[0-9a-f-]{36}\/problem$/);
    expect(complaints).toEqual([]);
    await close();
  });

  it('are found, sorted, put away, brought back and deleted with keys alone', async () => {
    const { page, complaints, close } = await openAs('supervisor');
    await addTrial(page, 'Line 3 seals', 'Line 3');
    await addTrial(page, 'Żółte pudełka', 'Press 2');
    await addTrial(page, 'A loaf that rises', 'Oven 1');
    await openAwake(page, `${at.running.url}/trials`);
    expect((await titles(page))[0]).toBe('A loaf that rises');
    await takeShot(page, 'trials-1280-light');

    await page.getByRole('link', { name: 'Trial', exact: true }).press('Enter');
    await page.waitForURL(/sort=title/);
    expect((await titles(page))[0]).toBe('No name yet');
    await page.locator('#search').fill('zolte');
    await page.locator('#search').press('Enter');
    await page.waitForURL(/search=zolte/);
    expect(await titles(page)).toEqual(['Żółte pudełka']);

    await openAwake(page, `${at.running.url}/trials`);
    await pickByKeys(page, 'Line 3 seals', 'Put away');
    await page.getByText('Put away: Line 3 seals.').waitFor();
    expect(await titles(page)).not.toContain('Line 3 seals');
    expect(await page.locator(':focus').textContent()).toContain('Undo');
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'trials-put-away');
    await page.keyboard.press('Enter');
    await page.locator('#trials-caption ~ tbody th', { hasText: 'Line 3 seals' }).waitFor();

    await pickByKeys(page, 'Line 3 seals', 'Put away');
    await page.getByText('Put away: Line 3 seals.').waitFor();
    await openAwake(page, `${at.running.url}/trials?show=away`);
    expect(await titles(page)).toEqual(['Line 3 seals']);
    await pickByKeys(page, 'Line 3 seals', 'Take out again');
    await page.getByText('Back in the list: Line 3 seals.').waitFor();

    await openAwake(page, `${at.running.url}/trials`);
    await pickByKeys(page, 'No name yet', 'Delete');
    const dialog = page.getByRole('alertdialog');
    await dialog.waitFor();
    expect(await page.locator(':focus').textContent()).toBe('Cancel');
    await takeShot(page, 'trials-delete');
    await dialog.getByRole('button', { name: 'Delete for good' }).press('Enter');
    await page.getByText('Deleted: No name yet.').waitFor();
    expect(await titles(page)).not.toContain('No name yet');

    await pickByKeys(page, 'Line 3 seals', 'Copy into a new trial');
    await page.waitForURL(/\/problem$/);
    await openAwake(page, `${at.running.url}/trials?search=line`);
    expect(await titles(page)).toEqual(['Line 3 seals', 'Line 3 seals']);
    expect(complaints).toEqual([]);
    await close();
  });

  it('stand one below the other on a phone, with the whole name in view', async () => {
    const { page, complaints, close } = await openAs('supervisor');
    await page.setViewportSize({ width: 360, height: 740 });
    for (const [language, colorScheme] of [
      ['en', 'light'],
      ['pl', 'dark'],
    ] as const) {
      await page.request.fetch(`${at.running.url}/api/me`, {
        method: 'PATCH',
        data: { language },
        headers: { Origin: at.running.url },
      });
      await page.emulateMedia({ colorScheme });
      await openAwake(page, `${at.running.url}/trials`);
      const first = page.locator('ul a', { hasText: 'Line 3 seals' }).first();
      await first.waitFor();
      const box = await first.boundingBox();
      expect(box?.height).toBeGreaterThanOrEqual(48);
      const wide = await page.evaluate(() => document.documentElement.scrollWidth);
      expect(wide).toBeLessThanOrEqual(360);
      expect(await findAccessFaults(page)).toEqual([]);
      await takeShot(page, `trials-360-${language}-${colorScheme}`);
    }
    expect(complaints).toEqual([]);
    await close();
  });

  it('are looked at by an engineer, who begins none', async () => {
    const { page, complaints, close } = await openAs('engineer');
    expect(new URL(page.url()).pathname).toBe('/trials');
    await openAwake(page, `${at.running.url}/trials`);
    expect(await page.getByRole('button', { name: 'New trial' }).count()).toBe(0);
    expect(await page.locator('tbody summary').count()).toBe(0);
    expect(await findAccessFaults(page)).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });
});
