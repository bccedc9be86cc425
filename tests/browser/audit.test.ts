import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import type { ShopScope } from '../../src/server/db/scope.ts';
import { buildMeasuredTrial, type ReadRun } from '../builders/measured-trial.ts';
import { findPersonOf, openAppDatabase } from '../setup/app-database.ts';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openAwake, openPage, type WatchedPage } from '../setup/browser.ts';
import { signIn } from '../setup/sign-in.ts';

const hotter: ReadRun = ({ coded, order }) => 35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

/** Puts a trial whose readings are in among the app's, and has every verdict signed off. */
async function addMeasuredTrial(app: { dataDir: string }): Promise<string> {
  const db = openAppDatabase(app);
  try {
    const { id, shopId } = await findPersonOf(db, 'dana@harrowlane.example');
    const scope: ShopScope = { db, shopId, actor: { kind: 'person', id } };
    await db('shops').where({ id: shopId }).update({ verdict_review: 'always' });
    return await buildMeasuredTrial(scope, { ownerId: id, read: hotter });
  } finally {
    await db.destroy();
  }
}

const at = withAppInBrowser({ standIns: true });
let sam: WatchedPage;
let page: Page;
let trialId: string;

beforeAll(async () => {
  sam = await openPage(at.browser);
  page = sam.page;
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write'], { origin: at.running.url });
  await signIn(page, at.running.url, 'engineer');
  trialId = await addMeasuredTrial(at.running);
});

const audit = (part: string) => openAwake(page, `${at.running.url}/trials/${trialId}/audit${part}`);

describe('an engineer', () => {
  it('signs the verdict off line by line once the worker has made it', async () => {
    await expect
      .poll(
        async () => {
          await audit('/sign-off');
          return page.getByRole('button', { name: 'Approve' }).count();
        },
        { timeout: 60_000, interval: 1_000 },
      )
      .toBe(1);
    expect(await findAccessFaults(page)).toEqual([]);
    await page.getByRole('button', { name: 'Send back' }).click();
    await page.getByText('Say at a line what must change').waitFor();
    await page.getByRole('button', { name: 'Remark Headline' }).click();
    await page.getByRole('textbox', { name: 'Remark on: Headline' }).fill('Agreed, run 7 looks fine');
    await page.getByRole('button', { name: 'Add the remark' }).click();
    await page.getByText('Agreed, run 7 looks fine').waitFor();
    await page.getByRole('button', { name: 'Approve' }).click();
    await page.getByRole('alertdialog').getByRole('button', { name: 'Approve' }).click();
    await page.getByText(/^Sam Okoro approved it/).waitFor();
    expect(sam.complaints).toEqual([]);
  });

  it('goes from each statement of the verdict to a place that is there', async () => {
    // Islands further down wake when they are seen: the page is read without them.
    await page.goto(`${at.running.url}/trials/${trialId}/verdict`);
    await page.getByText('For the engineer: the figures behind each statement').click();
    const links = await page
      .getByRole('link', { name: /^The figures ?: / })
      .evaluateAll((found) => found.map((link) => link.getAttribute('href') ?? ''));
    expect(links.length).toBeGreaterThan(5);
    for (const link of new Set(links)) {
      await page.goto(`${at.running.url}${link}`);
      expect(await page.locator(`[id="${link.split('#')[1]}"]`).count(), link).toBe(1);
    }
  });

  it('sorts and copies a table with the keyboard alone', async () => {
    await audit('/model');
    expect(await findAccessFaults(page)).toEqual([]);
    const terms = page.getByRole('table', { name: 'Terms of the model' });
    await terms.getByRole('button', { name: 'Effect' }).focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('Enter');
    expect(await terms.getByRole('columnheader', { name: 'Effect' }).getAttribute('aria-sort')).toBe(
      'descending',
    );
    expect(await terms.getByRole('rowheader').first().textContent()).toBe('A');
    await page.getByRole('button', { name: 'Copy table Terms of the model' }).focus();
    await page.keyboard.press('Enter');
    await page.getByText('Copied with all digits.').first().waitFor();
    const copied = await page.evaluate(() => navigator.clipboard.readText());
    expect(copied.split('\n')[1]).toMatch(/^A\t[^\t]+\t\d+\.\d{6,}\t/);
    await audit('/checks');
    expect(await findAccessFaults(page)).toEqual([]);
    expect(await page.getByRole('img', { name: 'Half-normal plot of effects' }).count()).toBe(1);
    expect(sam.complaints).toEqual([]);
  });

  it('keeps a model of their own beside the trial’s', async () => {
    await audit('/models');
    await page.getByRole('button', { name: 'Save the model' }).click();
    await page.getByText('Give it a name.').waitFor();
    await page.getByRole('textbox', { name: 'Name' }).fill('On logarithms');
    await page.getByRole('radio', { name: 'natural logarithm' }).check();
    await page.getByRole('button', { name: 'Save the model' }).click();
    await page.getByRole('link', { name: 'On logarithms' }).click();
    await page.getByText('Another model: On logarithms').waitFor();
    expect(await page.getByText('natural logarithm').count()).toBe(1);
    expect(sam.complaints).toEqual([]);
  });
});
