import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openAwake, openPage, takeShot } from '../setup/browser.ts';
import { addRunningTrial } from '../setup/running-trial.ts';
import { signIn } from '../setup/sign-in.ts';

const at = withAppInBrowser();

async function openBoard() {
  const trialId = await addRunningTrial(at.running);
  const watched = await openPage(at.browser);
  await signIn(watched.page, at.running.url, 'supervisor');
  await openAwake(watched.page, `${at.running.url}/trials/${trialId}/board`);
  return { ...watched, trialId };
}

const stateOfRun = (page: Page, run: number) =>
  page.getByRole('article', { name: `Run ${run}`, exact: true }).getAttribute('data-state');

async function openRun(page: Page, run: number): Promise<void> {
  await page.getByRole('button', { name: `Run ${run}`, exact: true }).click();
  await page.getByRole('dialog').waitFor();
}

async function typeReading(page: Page, figures: readonly string[]): Promise<void> {
  await page.getByRole('button', { name: 'Type the reading' }).click();
  const inputs = page.locator('dialog input[inputmode=decimal]');
  for (const [place, figure] of figures.entries()) await inputs.nth(place).fill(figure);
  await page.getByRole('button', { name: 'Save', exact: true }).click();
}

/** Turned off its own hours of reading, so that a look is a look at one state. */
async function look(page: Page, name: string): Promise<void> {
  for (const [width, colorScheme] of [
    [1280, 'light'],
    [360, 'dark'],
    [360, 'light'],
  ] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.setViewportSize({ width, height: width === 360 ? 780 : 800 });
    expect(await findAccessFaults(page), `${name}, ${width} px`).toEqual([]);
    const sticksOut = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(sticksOut, `${name}, ${width} px`).toBeLessThanOrEqual(0);
    await takeShot(page, `board-${name}-${width}-${colorScheme}`);
  }
  await page.emulateMedia({ colorScheme: 'light' });
  await page.setViewportSize({ width: 1280, height: 800 });
}

describe('the board', () => {
  it('takes every reading to the end, by tag and all at once, and leads to the verdict', async () => {
    const { page, complaints, close } = await openBoard();
    await page.getByText('No run has gone out yet').waitFor();
    await look(page, 'start');

    await openRun(page, 1);
    await typeReading(page, ['36,1', 'x', '2']);
    await page.getByText('This is not one number').waitFor();
    expect(await page.inputValue('#figure-0-1')).toBe('36,1');
    await look(page, 'reading');
    await page.fill('#figure-0-2', '36.9');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved for run 1.').waitFor();
    expect(await stateOfRun(page, 1)).toBe('done');

    await openRun(page, 1);
    await page.getByRole('button', { name: 'Correct the reading' }).click();
    await page.fill('#figure-0-1', '35');
    await page.fill('#figure-reason', 'Misread the dial');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved for run 1.').first().waitFor();
    await openRun(page, 1);
    await page.getByText('Misread the dial').waitFor();
    await look(page, 'story');
    await page.keyboard.press('Escape');

    await openRun(page, 2);
    await page.getByText('More', { exact: true }).click();
    await page.getByRole('button', { name: 'Skip this run' }).click();
    await page.getByText('Run 2 is skipped').waitFor();
    await openRun(page, 2);
    await page.getByRole('button', { name: 'Put back' }).click();
    await page.getByText('Run 2 is back in the plan').waitFor();
    await page.keyboard.press('Escape');

    await page.getByRole('button', { name: 'Type in all' }).click();
    const rows = await page.locator('table tbody tr').count();
    const sheet = Array.from({ length: rows }, (_, row) => `${38 + row / 10}\t${38.4 + row / 10}\t1`);
    await page.evaluate((text) => {
      const data = new DataTransfer();
      data.setData('text', text);
      const cell = document.querySelector('.board-cell');
      cell?.dispatchEvent(
        new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
      );
    }, sheet.join('\n'));
    expect(await page.locator('.board-cell').nth(4).inputValue()).toBe('38.5');
    await look(page, 'all');
    await page.getByRole('button', { name: 'Save all' }).click();
    // Between two looks of the page the readings may come in and the verdict be made: only the last is sure to be seen.
    await page.getByRole('link', { name: 'See the verdict' }).waitFor({ timeout: 60_000 });
    await look(page, 'end');
    expect(complaints).toEqual([]);
    await close();
  });

  it('stops with one tap, and says who must start it again', async () => {
    const { page, complaints, close } = await openBoard();
    await page.getByRole('button', { name: 'Something is wrong' }).click();
    await page.fill('#change-words', 'jaw not heating');
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('wrote “jaw not heating”').waitFor();
    await look(page, 'problem');
    await page.getByRole('button', { name: 'Dealt with' }).click();
    await page.getByRole('radio', { name: 'Yes' }).check();
    await page.fill('#resume-words', 'New heater');
    await page.getByRole('button', { name: 'Go on' }).click();
    await page.getByText('Repair: New heater').waitFor();

    await page.getByRole('button', { name: 'Stop for safety' }).click();
    await page.getByText(/^Stopped at/).waitFor();
    await page.getByText('the engineer or the safety person must say').waitFor();
    expect(await page.getByRole('button', { name: 'Start again' }).count()).toBe(0);
    await look(page, 'held');
    expect(complaints).toEqual([]);
    await close();
  });

  it('says since when it is not live, and keeps what was typed while the line is down', async () => {
    const { page, close } = await openBoard();
    await openRun(page, 1);
    await page.context().setOffline(true);
    await typeReading(page, ['36']);
    await page.getByText('No connection.').waitFor();
    expect(await page.inputValue('#figure-0-1')).toBe('36');
    await page.getByText(/^Not live since/).waitFor({ timeout: 60_000 });
    await page.context().setOffline(false);
    await page.getByRole('button', { name: 'Save', exact: true }).click();
    await page.getByText('Saved for run 1.').waitFor();
    await page.getByText(/^Not live since/).waitFor({ state: 'detached' });
    await close();
  });

  it('speaks Polish to whoever reads it, and prints a run sheet that fits across the page', async () => {
    const { page, trialId, complaints, close } = await openBoard();
    await page.locator('.head-menu summary').first().click();
    await page.locator('button[name="language"][value="pl"]').click();
    await page.getByRole('button', { name: 'Stop, zagrożenie' }).waitFor();
    await look(page, 'pl');
    await openAwake(page, `${at.running.url}/trials/${trialId}/paper`);
    await page.emulateMedia({ media: 'print', colorScheme: 'light' });
    // A landscape A4 page between its margins.
    await page.setViewportSize({ width: 1047, height: 718 });
    const cutOff = await page
      .locator('.run-sheet .table-frame')
      .evaluate((frame) => frame.scrollWidth - frame.clientWidth);
    expect(cutOff).toBeLessThanOrEqual(0);
    await takeShot(page, 'board-paper-pl');
    expect(complaints).toEqual([]);
    await close();
  });
});
