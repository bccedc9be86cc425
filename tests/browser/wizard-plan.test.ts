import type { Page } from 'playwright-core';
import { v7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import type { Answers } from '../../src/features/trial/answers.schema.ts';
import { finishedAnswers } from '../builders/answers.ts';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openAwake, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';
import { addDraft } from '../setup/draft-trial.ts';
import { signIn } from '../setup/sign-in.ts';

const at = withAppInBrowser({ standIns: true });

interface Draft extends WatchedPage {
  trialId: string;
  open(step: string): Promise<void>;
}

function patch(page: Page, path: string, data: object) {
  return page.request.patch(`${at.running.url}${path}`, { data, headers: { Origin: at.running.url } });
}

/** A supervisor with the answers of the first five pages given. */
async function startDraft(more: Answers = {}): Promise<Draft> {
  const watched = await openPage(at.browser);
  const { page } = watched;
  await signIn(page, at.running.url, 'supervisor');
  const trialId = await addDraft(page, at.running.url);
  const {
    crew: _crew,
    pace: _pace,
    ready: _ready,
    look: _look,
    ...given
  } = finishedAnswers({
    neverRun: { mixes: [] },
    spare: {},
    ...more,
  });
  for (const [question, content] of Object.entries(given)) {
    const saved = await patch(page, `/api/trials/${trialId}/answers`, {
      question,
      base: 0,
      content,
      save: v7(),
    });
    expect([question, saved.status()]).toEqual([question, 200]);
  }
  const open = async (step: string) => {
    await openAwake(page, `${at.running.url}/trials/${trialId}/${step}`);
  };
  return { ...watched, trialId, open };
}

/** Tabs until what has the focus fits, as somebody without a mouse does. */
async function tabTo(page: Page, wanted: string): Promise<void> {
  for (let presses = 0; presses < 80; presses += 1) {
    const isThere = await page.evaluate((selector) => document.activeElement?.matches(selector), wanted);
    if (isThere) return;
    await page.keyboard.press('Tab');
  }
  throw new RangeError(`tabTo: ${wanted} was not reached`);
}

async function pickPerson(page: Page, name: string): Promise<void> {
  await page.getByLabel('Who runs?').selectOption({ label: name });
}

async function speak(page: Page, language: string): Promise<void> {
  expect((await patch(page, '/api/me', { language })).ok()).toBe(true);
}

/** What the fake text service has for a phone, oldest first. */
async function readTexts(phone: string): Promise<string[]> {
  const answer = await fetch(new URL('/fake/texts', at.running.textsUrl ?? ''));
  const texts = (await answer.json()) as { to: string; body: string }[];
  return texts.filter(({ to }) => to === phone).map(({ body }) => body);
}

describe('picking a plan', () => {
  it('by keys alone: the sliders re-deal, a plan is taken, kept, and asked for again once answers change', async () => {
    const { page, complaints, open, close } = await startDraft();
    await open('plan');
    await page.getByRole('article').first().waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'plan-1280-en-light');
    await tabTo(page, '#spare-runs');
    for (let presses = 0; presses < 6; presses += 1) await page.keyboard.press('ArrowLeft');
    await expect
      .poll(() => page.getByRole('article').allTextContents())
      .not.toContainEqual(expect.stringMatching(/1[1-9] runs/));
    await tabTo(page, 'article button');
    await page.keyboard.press('Enter');
    await page.getByText('You took this plan').waitFor();
    await takeShot(page, 'plan-taken-1280');
    await open('plan');
    await page.getByText('You took this plan').waitFor();
    await tabTo(page, '#spare-runs');
    await page.keyboard.press('ArrowRight');
    await page.getByText('Take a plan again').waitFor();
    expect(complaints).toEqual([]);
    await close();
  });

  it('says which limit is in the way, and a press takes it away', async () => {
    const { page, complaints, open, close } = await startDraft({
      spare: { runs: '16', hours: '1', minutesPerRun: '45', moneyOpen: true },
    });
    await open('plan');
    await page.getByText('No plan fits in this time').waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'plan-misfit');
    await page.getByRole('button', { name: /Allow \d+ hours/ }).press('Enter');
    await page.getByRole('article').first().waitFor();
    expect(complaints).toEqual([]);
    await close();
  });

  it('reads well on a phone, in the dark and in Polish', async () => {
    const { page, complaints, open, close } = await startDraft();
    await page.setViewportSize({ width: 360, height: 740 });
    for (const [language, colorScheme] of [
      ['en', 'light'],
      ['pl', 'dark'],
    ] as const) {
      await speak(page, language);
      await page.emulateMedia({ colorScheme });
      for (const step of ['plan', 'crew']) {
        await open(step);
        if (step === 'plan') await page.getByRole('article').first().waitFor();
        const wide = await page.evaluate(() => document.documentElement.scrollWidth);
        expect(wide, step).toBeLessThanOrEqual(360);
        expect(await findAccessFaults(page), `${step} ${language}`).toEqual([]);
        await takeShot(page, `${step}-360-${language}-${colorScheme}`);
      }
    }
    await page.setViewportSize({ width: 1280, height: 800 });
    await open('plan');
    await page.getByRole('article').first().waitFor();
    await takeShot(page, 'plan-1280-pl-dark');
    await speak(page, 'en');
    expect(complaints).toEqual([]);
    await close();
  });
});

describe('who and when', () => {
  it('is said shift by shift, shows the text in each language, and sends run 1 as practice', async () => {
    const { page, complaints, open, close } = await startDraft();
    await open('plan');
    await page.getByRole('button', { name: 'Take this plan' }).first().click();
    await page.getByText('You took this plan').waitFor();
    await open('crew');
    await page.getByRole('button', { name: 'Add a shift' }).press('Enter');
    await page.keyboard.type('Day');
    await page.getByLabel('From').fill('06:00');
    await page.getByLabel('To', { exact: true }).fill('14:00');
    await pickPerson(page, 'Ana Ruiz');
    await page.getByLabel('Who measures?').selectOption({ label: 'Minh Trần' });
    const minh = page.getByRole('group', { name: /Minh Trần/ });
    await minh.getByRole('radio', { name: 'Text' }).press('Space');
    await page.getByText('Minh Trần has not been asked yet.').waitFor();
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'crew-1280-en-light');
    await page.getByRole('button', { name: 'Use paper' }).press('Enter');
    expect(await minh.getByRole('radio', { name: 'Paper' }).isChecked()).toBe(true);
    const languages = page.getByRole('group', { name: 'Language' });
    await languages.waitFor();
    expect(await languages.getByRole('radio').count()).toBe(2);
    await languages.getByRole('radio', { name: 'Tiếng Việt' }).press('Space');
    expect(await page.locator('.text-bubble').textContent()).toContain('JAW TEMP');
    await page.getByRole('button', { name: 'Send run 1 to my phone' }).press('Enter');
    await page.getByText('It is on its way to your phone.').waitFor();
    await takeShot(page, 'crew-sent');
    await open('crew');
    expect(await page.getByLabel('Shift', { exact: true }).inputValue()).toBe('Day');
    expect(await readTexts('+12025550142')).toEqual([]);
    expect(complaints).toEqual([]);
    await close();
  });
});
