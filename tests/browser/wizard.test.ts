import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';
import { addDraft } from '../setup/draft-trial.ts';
import { nextByKey, pick, settle, tabTo, typeInto } from '../setup/keys.ts';
import { signIn } from '../setup/sign-in.ts';
import { traceWork } from '../setup/trace-work.ts';

const at = withAppInBrowser();

interface Draft extends WatchedPage {
  trialId: string;
  open(step: string): Promise<void>;
}

/** A supervisor with a blank trial, in a browser of their own. */
async function startDraft(options: Parameters<typeof openPage>[1] = {}): Promise<Draft> {
  const watched = await openPage(at.browser, options);
  await signIn(watched.page, at.running.url, 'supervisor');
  const trialId = await addDraft(watched.page, at.running.url);
  const open = async (step: string) => {
    await watched.page.goto(`${at.running.url}/trials/${trialId}/${step}`);
    await settle(watched.page);
  };
  await open('problem');
  return { ...watched, trialId, open };
}

function saved(page: Page): Promise<unknown> {
  return page.getByText(/^Saved \d\d:\d\d$/).waitFor();
}

describe('the wizard', () => {
  it('takes a supervisor through its first pages with keys alone, and shows the plan as they type', async () => {
    const { page, complaints, open, close } = await startDraft();
    expect(await page.evaluate(() => document.activeElement?.tagName)).toBe('H1');
    await typeInto(page, 'machine', 'Line 3');
    await typeInto(page, 'result-name', 'seal strength');
    await pick(page, 'wish', 'more');
    await pick(page, 'kind', 'measured');
    await typeInto(page, 'unit', 'N');
    await saved(page);
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'wizard-problem-1280');
    await nextByKey(page, 'today');

    await typeInto(page, 'usual', '35');
    await typeInto(page, 'lowest', '31');
    await typeInto(page, 'highest', '39,0');
    await page.getByText('it still moves about 4 N up or down').waitFor();
    await page.getByRole('button', { name: '3', exact: true }).press('Enter');
    await tabTo(page, 'no-limit');
    await page.keyboard.press('Space');
    await saved(page);
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'wizard-today-1280');
    await nextByKey(page, 'settings');

    await page.getByRole('button', { name: 'Add a number' }).press('Enter');
    for (const text of ['Jaw temp', 'JAW TEMP', '140', '160', '150', 'C']) {
      await page.keyboard.type(text);
      await page.keyboard.press('Tab');
    }
    await page.getByRole('button', { name: 'Add an A-or-B' }).press('Enter');
    for (const text of ['Film', '', 'Supplier A', 'Supplier B']) {
      await page.keyboard.type(text);
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Space');
    await page.locator('.question-side .small-tag').first().waitFor();
    expect(await page.locator('.question-side').textContent()).toMatch(/\d+ runs/);
    await saved(page);
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'wizard-settings-1280');

    await open('settings');
    expect(await page.locator('input[id$="-name"]').first().inputValue()).toBe('Jaw temp');
    expect(complaints).toEqual([]);
    await close();
  });

  it('moves, takes away and brings back settings, and reads rows of a spreadsheet', async () => {
    const { page, complaints, open, close } = await startDraft();
    await open('settings');
    await page.getByText('Paste from a spreadsheet').click();
    await page
      .getByLabel('Rows of settings')
      .fill('Name\tLow\tHigh\tNow\tUnit\nJaw temp\t140\t160\t150\tC\nDwell\t0,8\t1,0\t0,8\ts\nFilm\tA\tB\tA');
    await page.getByRole('button', { name: 'Add these' }).click();
    await page.getByText('3 settings were added.').waitFor();
    const heads = () => page.locator('main section h2').allTextContents();
    expect(await heads()).toEqual(['1 Jaw temp', '2 Dwell', '3 Film']);
    await page.locator('summary', { hasText: 'Move' }).first().click();
    await page.getByRole('button', { name: 'Move down' }).first().click();
    expect(await heads()).toEqual(['1 Dwell', '2 Jaw temp', '3 Film']);
    await page.getByRole('button', { name: 'Remove Jaw temp' }).click();
    expect(await heads()).toEqual(['1 Dwell', '2 Film']);
    await page.getByRole('button', { name: 'Undo' }).click();
    expect(await heads()).toEqual(['1 Dwell', '2 Jaw temp', '3 Film']);
    await saved(page);
    expect(complaints).toEqual([]);
    await close();
  });

  it('loses nothing without a connection, at a reload, or to another device', async () => {
    const { page, complaints, open, trialId, close } = await startDraft();
    await open('today');
    await page.context().setOffline(true);
    await page.fill('#worth', '3');
    await page.getByText('Not saved yet: no connection. What you typed is kept here.').waitFor();
    await page.context().setOffline(false);
    await page.evaluate(() => dispatchEvent(new Event('online')));
    await saved(page);

    await page.fill('#worth', '4');
    await page.reload();
    await settle(page);
    expect(await page.inputValue('#worth')).toBe('4');
    await saved(page);

    const other = await openPage(at.browser);
    await signIn(other.page, at.running.url, 'supervisor');
    await other.page.goto(`${at.running.url}/trials/${trialId}/today`);
    await settle(other.page);
    expect(await other.page.inputValue('#worth')).toBe('4');
    await other.page.fill('#worth', '5');
    await saved(other.page);
    await page.fill('#worth', '6');
    const callout = page.getByRole('alert');
    await callout.getByText('Yours: 6').waitFor();
    expect(await callout.textContent()).toContain(': 5');
    await takeShot(page, 'wizard-conflict-1280');
    await callout.getByRole('button', { name: 'Keep mine' }).click();
    await saved(page);
    await other.page.reload();
    await settle(other.page);
    expect(await other.page.inputValue('#worth')).toBe('6');
    const offline = complaints.filter((text) => !text.includes('net::ERR_INTERNET_DISCONNECTED'));
    expect(offline).toEqual([]);
    await other.close();
    await close();
  });

  it('shows a second tab of the same browser what the first one saved', async () => {
    const { page, open, close } = await startDraft();
    await open('today');
    const tab = await page.context().newPage();
    await tab.goto(page.url());
    await settle(tab);
    await page.fill('#worth', '7');
    await saved(page);
    await expect.poll(() => tab.inputValue('#worth'), { timeout: 10_000 }).toBe('7');
    await close();
  });

  it('says what is missing only when asked, and leads to it', async () => {
    const { page, open, close } = await startDraft();
    expect(await page.locator('.field-error').count()).toBe(0);
    await open('today');
    await page.locator('.question-side a', { hasText: 'To do' }).click();
    await page.waitForURL('**/problem#to-do');
    await page.locator('#machine-error').waitFor();
    expect(await page.evaluate(() => document.activeElement?.id)).toBe('machine');
    await takeShot(page, 'wizard-missing-1280');
    await close();
  });

  it('reads past numbers from a file and checks the gauge', async () => {
    const { page, complaints, open, close } = await startDraft();
    await open('today');
    await page.getByText('Paste or load past numbers').click();
    const rows = ['day;N', '1;35,2', '2;33,9', '3;36,1', '4;34,4', '5;35,0'].join('\n');
    await page.setInputFiles('#past-file', {
      name: 'past.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(rows),
    });
    await expect.poll(() => page.inputValue('#past')).toContain('35,2\n33,9');
    await page.locator('.track-dot').nth(4).waitFor();
    await page.getByText('Check your gauge').click();
    for (let part = 0; part < 3; part += 1) {
      await page.fill(`#gauge-${part}-first`, `${35 + part}`);
      await page.fill(`#gauge-${part}-second`, `${35.1 + part}`);
    }
    await page.getByText('The gauge is good enough.').waitFor();
    expect(complaints).toEqual([]);
    await close();
  });

  it('holds no key up for 50 ms on a slow device', async () => {
    const { page, open, close } = await startDraft();
    await open('settings');
    await page.getByText('Paste from a spreadsheet').click();
    const rows = Array.from(
      { length: 7 },
      (_, place) => `Setting ${place}\t${place}\t${place + 10}\t${place + 5}\tC`,
    );
    await page.getByLabel('Rows of settings').fill(rows.join('\n'));
    await page.getByRole('button', { name: 'Add these' }).click();
    await saved(page);
    const slowDown = 4;
    const longest: number[] = [];
    // What else the machine does can only lengthen a piece of work, so the shortest of a few typings is the page's own.
    for (const words of ['temperature', ' of the jaw', ' on line 3']) {
      const readWork = await traceWork(at.browser);
      await page.locator('input[id$="-name"]').first().focus();
      await page.keyboard.press('End');
      await page.keyboard.type(words, { delay: 150 });
      await saved(page);
      longest.push(slowDown * (await readWork()));
    }
    expect(Math.min(...longest), longest.join(', ')).toBeLessThan(50);
    await close();
  });
});

describe('the wizard on a phone', () => {
  it('is filled in by touch at 360 px', async () => {
    const phone = { viewport: { width: 360, height: 740 }, hasTouch: true, isMobile: true } as const;
    const { page, complaints, open, close } = await startDraft(phone);
    await page.locator('label', { hasText: 'Sealing' }).tap();
    await page.locator('#machine').fill('Line 3');
    await saved(page);
    await takeShot(page, 'wizard-problem-360');
    await page.getByRole('link', { name: 'Next' }).tap();
    await page.waitForURL('**/today');
    for (const step of ['today', 'settings']) {
      await open(step);
      const sticksOut = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(sticksOut, step).toBeLessThanOrEqual(0);
      expect(await findAccessFaults(page), step).toEqual([]);
      await takeShot(page, `wizard-${step}-360`);
    }
    await page.locator('.question-side-line summary').tap();
    await page.locator('.question-side-line .small-tag').first().waitFor();
    await takeShot(page, 'wizard-so-far-360');
    expect(complaints).toEqual([]);
    await close();
  });
});
