import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { demoSignIns } from '../../src/server/demo-sign-ins.ts';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';

const at = withAppInBrowser({ standIns: true });

/** Signs one of the demo's people in, in a browser of their own. */
async function signInAs(role: (typeof demoSignIns)[number]['role']): Promise<WatchedPage> {
  const person = demoSignIns.find((each) => each.role === role);
  const watched = await openPage(at.browser);
  const { page } = watched;
  await page.goto(`${at.running.url}/sign-in`);
  await page.fill('input[name=email]', person?.email ?? '');
  await page.fill('input[name=password]', person?.password ?? '');
  await page.click('main button[type=submit]');
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  return watched;
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(at.running.url + path, { waitUntil: 'networkidle' });
}

/** What the fake text service has for a phone, oldest first. */
async function readTexts(phone: string): Promise<string[]> {
  const answer = await fetch(new URL('/fake/texts', at.running.textsUrl ?? ''));
  const texts = (await answer.json()) as { to: string; body: string }[];
  return texts.filter(({ to }) => to === phone).map(({ body }) => body);
}

async function textBack(from: string, body: string): Promise<void> {
  await fetch(new URL('/fake/texts', at.running.textsUrl ?? ''), {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ from, to: '+12025550100', body }),
  });
}

describe('people', () => {
  it('are added by a supervisor, asked by text, and say yes on their phone', async () => {
    const { page, complaints, close } = await signInAs('supervisor');
    await open(page, '/people/new');
    await page.click('main form button[type=submit]');
    expect(await page.locator(':focus').getAttribute('name')).toBe('name');
    await page.fill('[name=name]', 'Nia Brook');
    await page.fill('[name=phone]', '12');
    await page.fill('[name="hours.0.from"]', '0');
    await page.fill('[name="hours.0.to"]', '0');
    for (const day of ['6', '7']) await page.check(`[name="hours.0.days"][value="${day}"]`);
    await page.click('main form button[type=submit]');
    await page.waitForSelector('#phone-error');
    expect(await page.locator(':focus').getAttribute('name')).toBe('phone');
    expect(await page.inputValue('[name=name]')).toBe('Nia Brook');
    await takeShot(page, 'people-refused');
    await page.fill('[name=phone]', '202 555 0133');
    await page.click('main form button[type=submit]');
    await page.waitForURL(/\/people\/[0-9a-f-]{36}$/);

    await expect.poll(() => readTexts('+12025550133')).toHaveLength(1);
    await textBack('+12025550133', 'OK');
    await expect.poll(() => readTexts('+12025550133')).toHaveLength(2);
    await page.reload({ waitUntil: 'networkidle' });
    expect(await page.locator('main').textContent()).toContain('Said OK');
    expect(await page.locator('main').textContent()).not.toContain('2025550133');
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'people-agreed');
    expect(complaints).toEqual([]);
    await close();
  });

  it('leave the crew and come back with one press, and are erased only after a question', async () => {
    const { page, complaints, close } = await signInAs('admin');
    await open(page, '/people?search=nia');
    await page.click('text=Nia Brook');
    await page.waitForLoadState('networkidle');
    await page.getByRole('button', { name: 'Take off the crew' }).click();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByText('Nia Brook is on the crew again.').waitFor();
    await page.getByRole('button', { name: 'Erase this person' }).click();
    const dialog = page.getByRole('alertdialog');
    await dialog.waitFor();
    expect(await page.locator(':focus').textContent()).toBe('Cancel');
    await takeShot(page, 'people-erase');
    await dialog.getByRole('button', { name: 'Erase for good' }).click();
    await page.getByText('Erased. The row stays as').waitFor();
    await open(page, '/people?show=not+active');
    expect(await page.locator('main').textContent()).toContain('former operator 1');
    expect(complaints).toEqual([]);
    await close();
  });

  it('changed by two admins at once are shown to the slower one', async () => {
    const { page, complaints, close } = await signInAs('admin');
    await open(page, '/people?search=marek');
    await page.click('text=Marek Zielony');
    await page.waitForLoadState('networkidle');
    const id = page.url().split('/').pop() ?? '';
    await page.fill('[name=name]', 'Marek Z.');
    const faster = await page.request.patch(`${at.running.url}/api/people/${id}`, {
      data: { revision: 1, language: 'en' },
      headers: { Origin: at.running.url },
    });
    expect(faster.status()).toBe(200);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Somebody else changed this person').waitFor();
    expect(await page.inputValue('[name=name]')).toBe('Marek Z.');
    await takeShot(page, 'people-conflict');
    await page.getByRole('button', { name: 'Save mine' }).click();
    await page.getByText('Saved.').waitFor();
    expect(complaints).toEqual([]);
    await close();
  });

  it('typed while the line is down are not lost', async () => {
    const { page, close } = await signInAs('admin');
    await open(page, '/people/new');
    await page.fill('[name=name]', 'Kim Day');
    await page.context().setOffline(true);
    await page.click('main form button[type=submit]');
    await page.getByText('No connection.').waitFor();
    expect(await page.inputValue('[name=name]')).toBe('Kim Day');
    await page.context().setOffline(false);
    await page.click('main form button[type=submit]');
    await page.waitForURL(/\/people\/[0-9a-f-]{36}$/);
    await close();
  });

  it('come in from a list that is right, and not from one that is wrong or far too long', async () => {
    const { page, complaints, close } = await signInAs('admin');
    await open(page, '/people/import');
    const choose = (text: string) =>
      page.setInputFiles('input[type=file]', {
        name: 'crew.csv',
        mimeType: 'text/csv',
        buffer: Buffer.from(text),
      });
    const check = () => page.getByRole('button', { name: 'Check the file' }).click();

    await choose(`name;phone\n${'Somebody with a long name;+12025550101\n'.repeat(100_000)}`);
    await check();
    await page.getByText('has 100,000 rows').waitFor();
    await choose('name;phone\nJo Lane;12\nAna again;+12025550142\n');
    await check();
    await page.getByText('2 things to mend').waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'people-import-wrong');
    await choose('\uFEFFname;phone\r\nJo Lane;+12025550118\r\n"Brook; Eve";\r\n');
    await check();
    await page.getByRole('button', { name: 'Add 2 people' }).click();
    await page.getByText('2 people were added.').waitFor();
    await takeShot(page, 'people-import-done');
    expect(complaints).toEqual([]);
    await close();
  });
});

describe('the shop', () => {
  it('is no page for a supervisor', async () => {
    const { page, close } = await signInAs('supervisor');
    for (const path of ['/shop', '/shop/texts-check', '/shop/poster', '/activity', '/people/import']) {
      const answer = await page.goto(at.running.url + path);
      expect(answer?.status(), path).toBe(403);
    }
    await close();
  });

  it('asks who answers for safety before plans go unseen', async () => {
    const { page, complaints, close } = await signInAs('admin');
    await open(page, '/shop');
    await page.locator('[name=planReview][value=never]').check({ force: true });
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.waitForSelector('#reviewStatement-error');
    await takeShot(page, 'shop-statement');
    await page.fill('[name=reviewStatement]', 'Robin Vale, plant manager, answers for safety.');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved.').waitFor();
    expect(complaints).toEqual([]);
    await close();
  });

  it('checks its texts both ways with one text', async () => {
    const { page, complaints, close } = await signInAs('admin');
    await open(page, '/shop/texts-check');
    await page.getByRole('link', { name: 'Go to my entry' }).click();
    await page.waitForLoadState('networkidle');
    await page.fill('[name=phone]', '+1 202 555 0199');
    await page.fill('[name="hours.0.from"]', '00:00');
    await page.fill('[name="hours.0.to"]', '00:00');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved.').waitFor();
    await open(page, '/shop/texts-check');
    await page.getByRole('button', { name: 'Text me' }).click();
    await page.getByText('Answer the text now: OK.').waitFor();
    await takeShot(page, 'shop-check-waiting');
    await textBack('+12025550199', 'OK');
    await page.getByText('Texts work both ways.').waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'shop-check-good');
    expect(complaints).toEqual([]);
    await close();
  });
});
