import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import type { PublicAnswers } from '../../src/features/trial/saved-answers.schema.ts';
import { type Language, languages } from '../../src/i18n/languages.ts';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { openPage, type WatchedPage } from '../setup/browser.ts';
import { fingerOn, type Hands, keysOn } from '../setup/hands.ts';
import { signIn } from '../setup/sign-in.ts';

const at = withAppInBrowser({ standIns: true });
const phone = { viewport: { width: 360, height: 740 }, hasTouch: true, isMobile: true } as const;

/** Somebody of the demo shop in a browser of their own, who reads in a language. */
async function come(role: 'supervisor' | 'engineer', language: Language, options = {}): Promise<WatchedPage> {
  const watched = await openPage(at.browser, options);
  await signIn(watched.page, at.running.url, role);
  await watched.page.request.patch(`${at.running.url}/api/me`, {
    data: { language },
    headers: { Origin: at.running.url },
  });
  return watched;
}

async function awake(page: Page): Promise<void> {
  await page.waitForFunction(
    () => document.querySelector('astro-island[ssr][client="load"]') === null,
    undefined,
    {
      polling: 100,
    },
  );
}

/** A walk through the wizard: knows the order of the pages, leaves the answers to its caller. */
function walker(page: Page, hands: Hands) {
  return {
    async begin() {
      await page.goto(`${at.running.url}/trials`);
      await awake(page);
      await hands.press('main button.button-primary');
      await page.waitForURL('**/problem');
      await awake(page);
    },
    async next(step: string) {
      await hands.press('.action-bar a.button-primary');
      await page.waitForURL(`**/${step}`);
      await awake(page);
    },
  };
}

type Walker = ReturnType<typeof walker>;

/** From what may hurt someone to the last page, with the least that a sound trial needs. */
async function answerTheRest(page: Page, hands: Hands, { next }: Walker, hazards: readonly string[]) {
  for (const hazard of hazards) {
    await hands.tick(`fieldset[id="cautions-${hazard}"] input[value="guardsClosed"]`);
  }
  await hands.type('#call-first-whom', 'Dana, ext 12');
  await hands.pick('fate', 'hold');
  await next('around');
  for (const thing of ['batch', 'shift', 'machine', 'gauge', 'crew']) {
    await hands.pick(`around-${thing}`, 'same');
  }
  await hands.pick('around-room', 'writeDown');
  await next('plan');
  await page.locator('.plan-card').first().waitFor();
  await hands.press('.plan-card button');
  await page.locator('.plan-card-taken').waitFor();
  await next('crew');
  await hands.press('#add-shift');
  await hands.type('#shift-0-name', 'A');
  await hands.time('#shift-0-from', { hour: 6, half: 'AM' });
  await hands.time('#shift-0-to', { hour: 2, half: 'PM' });
  await hands.choose('#shift-0-runs', 'Ana Ruiz');
  await page.locator('fieldset[id^="way-"]').first().waitFor();
  const way = (await page.locator('fieldset[id^="way-"]').first().getAttribute('id')) ?? '';
  await hands.pick(way, 'text');
  await next('start');
}

async function readAnswers(page: Page, trialId: string): Promise<PublicAnswers> {
  return (await page.request.get(`${at.running.url}/api/trials/${trialId}/answers`)).json();
}

/** Looks at the hardest runs, makes ready, asks the engineer, and starts once they agree. */
async function start(page: Page, hands: Hands, language: Language): Promise<string> {
  const trialId = new URL(page.url()).pathname.split('/')[2] ?? '';
  const { plan } = await readAnswers(page, trialId);
  for (const { order } of plan?.hardest ?? []) await hands.pick(`look-${order}`, 'runBefore');
  for (const thing of ['guardsOn', 'crewMaySayNo', 'boxAndLabels', 'enoughMaterial', 'gaugeChecked']) {
    await hands.tick(`#ready-${thing}`);
  }
  await hands.press('.action-bar-main button');
  await expect
    .poll(async () => (await readAnswers(page, trialId)).state, { timeout: 20_000 })
    .toBe('plan review');
  const engineer = await come('engineer', language);
  const { review } = await readAnswers(engineer.page, trialId);
  const approved = await engineer.page.request.post(`${at.running.url}/api/reviews/${review?.id}/approve`, {
    data: { round: review?.round },
    headers: { Origin: at.running.url },
  });
  expect(approved.ok()).toBe(true);
  await engineer.close();
  await page.reload();
  await awake(page);
  await hands.press('.action-bar-main button.button-primary');
  await page.getByRole('alertdialog').waitFor();
  await hands.press('[role="alertdialog"] button.button-primary');
  await expect
    .poll(async () => (await readAnswers(page, trialId)).state, { timeout: 20_000 })
    .toBe('running');
  return trialId;
}

/** The sealing starter, from the list of trials to a trial that runs; answers how many actions it took until it was ready to send. */
async function walkSealing(page: Page, hands: Hands, language: Language): Promise<number> {
  const walk = walker(page, hands);
  await walk.begin();
  await hands.pick('starter', 'sealing');
  await hands.type('#machine', 'Line 3');
  for (const step of ['today', 'settings', 'safety']) await walk.next(step);
  await answerTheRest(page, hands, walk, ['hotParts', 'movingParts']);
  const toHere = hands.actions;
  await start(page, hands, language);
  return toHere;
}

describe('from “new trial” to “started”', { timeout: 240_000 }, () => {
  it.each(languages)('by keys alone (%s)', async (language) => {
    const { page, complaints, close } = await come('supervisor', language);
    const hands = keysOn(page);
    expect(await walkSealing(page, hands, language)).toBeLessThanOrEqual(60);
    expect(await page.locator('html').getAttribute('lang')).toBe(language);
    expect(hands.actions).toBeLessThanOrEqual(60);
    expect(complaints).toEqual([]);
    await close();
  });

  it.each(languages)('by touch on a phone of 360 px (%s)', async (language) => {
    const { page, complaints, close } = await come('supervisor', language, phone);
    expect(await walkSealing(page, fingerOn(page), language)).toBeLessThanOrEqual(60);
    expect(complaints).toEqual([]);
    await close();
  });

  it('from a blank page in at most 130 actions', async () => {
    const { page, complaints, close } = await come('supervisor', 'en');
    const hands = keysOn(page);
    const walk = walker(page, hands);
    await walk.begin();
    await hands.pick('starter', 'blank');
    await hands.type('#machine', 'Line 3');
    await hands.type('#result-name', 'seal strength');
    await hands.pick('wish', 'more');
    await hands.pick('kind', 'measured');
    await hands.type('#unit', 'N');
    await hands.pick('who', 'operator');
    await hands.pick('when', 'atOnce');
    await hands.type('#parts-per-run', '3');
    await walk.next('today');
    await hands.type('#usual', '35');
    await hands.type('#lowest', '31');
    await hands.type('#highest', '39');
    await hands.type('#worth', '3');
    await hands.tick('#no-limit');
    await walk.next('settings');
    const settings = [
      ['Jaw temp', 'JAW TEMP', '140', '160', '150', 'C'],
      ['Dwell', 'DWELL', '0.8', '1', '0.8', 's'],
      ['Pressure', 'PRESS', '3', '4', '3', 'bar'],
    ];
    for (const setting of settings) {
      await hands.press('#add-number');
      const fields = ['name', 'panel', 'low', 'high', 'usual', 'unit'];
      for (const [place, field] of fields.entries()) {
        await hands.type(`section:last-of-type input[id$="-${field}"]`, setting[place] ?? '');
      }
    }
    await walk.next('safety');
    await hands.tick('fieldset[id="hazards"] input[value="hotParts"]');
    await hands.tick('fieldset[id="stop-rules"] input[value="smoke"]');
    await answerTheRest(page, hands, walk, ['hotParts']);
    await start(page, hands, 'en');
    expect(hands.actions).toBeLessThanOrEqual(130);
    expect(complaints).toEqual([]);
    await close();
  });
});
