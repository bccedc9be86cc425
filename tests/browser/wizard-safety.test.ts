import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import type { PublicAnswers } from '../../src/features/trial/saved-answers.schema.ts';
import { toBrief } from '../../src/features/trial/to-brief.ts';
import { proposePlans } from '../../src/lib/doe/index.ts';
import { finishedAnswers } from '../builders/answers.ts';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot, type WatchedPage } from '../setup/browser.ts';
import { addDraft } from '../setup/draft-trial.ts';
import { signIn } from '../setup/sign-in.ts';

const at = withAppInBrowser();

const views = [
  { width: 1280, colorScheme: 'light' },
  { width: 360, colorScheme: 'dark' },
  { width: 360, colorScheme: 'light' },
  { width: 1280, colorScheme: 'dark' },
] as const;

async function call<Answer>(page: Page, method: string, path: string, data?: unknown): Promise<Answer> {
  const answer = await page.request.fetch(at.running.url + path, {
    method,
    headers: { Origin: at.running.url },
    ...(data === undefined ? {} : { data }),
  });
  if (!answer.ok()) throw new Error(`${method} ${path}: ${answer.status()} ${await answer.text()}`);
  return answer.json();
}

async function settle(page: Page): Promise<void> {
  await page.waitForLoadState('networkidle');
  await page.waitForFunction(() => !document.querySelector('astro-island[ssr]'));
}

async function open(page: Page, path: string): Promise<void> {
  await page.goto(at.running.url + path);
  await settle(page);
}

/** Tabs until the control with this name has the focus, as somebody without a mouse does. */
async function tabTo(page: Page, wanted: string): Promise<void> {
  for (let presses = 0; presses < 150; presses += 1) {
    const isThere = await page.evaluate((name) => {
      const active = document.activeElement;
      if (!(active instanceof HTMLElement) || active === document.body) return false;
      const words = active instanceof HTMLInputElement ? active.labels?.[0]?.textContent : active.textContent;
      return active.id === name || (words ?? '').replace(/\s+/g, ' ').trim().startsWith(name);
    }, wanted);
    if (isThere) return;
    await page.keyboard.press('Tab');
  }
  throw new RangeError(`tabTo: ${wanted} was not reached`);
}

async function press(page: Page, wanted: string, key = 'Enter'): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.press(key);
}

async function typeInto(page: Page, wanted: string, text: string): Promise<void> {
  await tabTo(page, wanted);
  await page.keyboard.type(text);
}

/** Picks one of a group of radio buttons with the keys. */
async function pick(page: Page, group: string, value: string): Promise<void> {
  for (let presses = 0; presses < 150; presses += 1) {
    const isIn = await page.evaluate((id) => document.activeElement?.closest('fieldset')?.id === id, group);
    if (isIn) break;
    await page.keyboard.press('Tab');
  }
  await page.keyboard.press('Space');
  for (let presses = 0; presses < 6; presses += 1) {
    const isIt = await page.evaluate(
      (name) => (document.activeElement as HTMLInputElement).value === name,
      value,
    );
    if (isIt) return;
    await page.keyboard.press('ArrowDown');
  }
  throw new RangeError(`pick: ${value} is not in ${group}`);
}

/** Both widths, both schemes: nothing sticks out, nothing is hidden from anybody. */
async function look(page: Page, name: string): Promise<void> {
  for (const { width, colorScheme } of views) {
    await page.setViewportSize({ width, height: 800 });
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    expect(await findAccessFaults(page), `${name}, ${width} px, ${colorScheme}`).toEqual([]);
    const sticksOut = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(sticksOut, `${name}, ${width} px`).toBeLessThanOrEqual(0);
    await takeShot(page, `${name}-${width}-${colorScheme}`);
  }
  await page.setViewportSize({ width: 1280, height: 800 });
  await page.emulateMedia({ colorScheme: 'light' });
}

function saved(page: Page): Promise<unknown> {
  return page.getByText(/^Saved \d\d:\d\d$/).waitFor();
}

/** A supervisor with a draft that is answered but for what these tests are about. */
async function startDraft(): Promise<WatchedPage & { trialId: string }> {
  const watched = await openPage(at.browser);
  const { page } = watched;
  await signIn(page, at.running.url, 'supervisor');
  const trialId = await addDraft(page, at.running.url);
  const list = await call<{ people: { id: string; roles: string[] }[] }>(
    page,
    'GET',
    '/api/people?show=active',
  );
  const runs = list.people.find(({ roles }) => roles.includes('operator'))?.id ?? '';
  const {
    hazards,
    stop,
    call: whom,
    neverRun,
    parts,
    around,
    ready,
    ...answers
  } = finishedAnswers({
    crew: { shifts: [{ id: 'day', name: 'Day', from: '06:00', to: '14:00', runs }] },
  });
  expect([hazards, stop, whom, neverRun, parts, around, ready]).not.toContain(undefined);
  for (const [question, content] of Object.entries(answers)) {
    await save(page, trialId, question, content);
  }
  return { ...watched, trialId };
}

async function save(page: Page, trialId: string, question: string, content: unknown): Promise<void> {
  const data = { question, base: 0, content, save: crypto.randomUUID() };
  await call(page, 'PATCH', `/api/trials/${trialId}/answers`, data);
}

function readAnswers(page: Page, trialId: string): Promise<PublicAnswers> {
  return call(page, 'GET', `/api/trials/${trialId}/answers`);
}

/** Takes the plan that is recommended for what is saved. */
async function choosePlan(page: Page, trialId: string): Promise<void> {
  const { revision, questions } = await readAnswers(page, trialId);
  const typed = Object.fromEntries(Object.entries(questions).map(([name, saved]) => [name, saved?.content]));
  const read = toBrief(typed);
  if ('problems' in read) throw new Error(JSON.stringify(read.problems));
  const [first] = proposePlans(read.brief);
  await call(page, 'POST', `/api/trials/${trialId}/plan`, { revision, proposalId: first?.id });
}

describe('safety, what gets in the way, and the start', () => {
  it('are answered by keys alone, looked at by the engineer, and started', { timeout: 400_000 }, async () => {
    const { page, complaints, trialId, close } = await startDraft();

    await open(page, `/trials/${trialId}/safety`);
    await press(page, 'Hot parts', 'Space');
    await press(page, 'Guards are closed', 'Space');
    await typeInto(page, 'protects-hotParts', 'Screen at the jaws');
    await press(page, 'Smoke or a burnt smell', 'Space');
    await typeInto(page, 'call-first-whom', 'Dana, ext 12');
    await press(page, 'Add a mix');
    await page.getByText('This rules out 2 of 8 mixes.').waitFor();
    await press(page, 'Remove this mix');
    await pick(page, 'fate', 'hold');
    await typeInto(page, 'parts-label', 'HOLD');
    await saved(page);
    await look(page, 'wizard-safety');

    await press(page, 'Next');
    await page.waitForURL('**/around');
    await settle(page);
    for (const [thing, way] of [
      ['batch', 'same'],
      ['shift', 'same'],
      ['machine', 'noIssue'],
      ['gauge', 'same'],
      ['room', 'writeDown'],
      ['crew', 'same'],
    ] as const) {
      await pick(page, `around-${thing}`, way);
    }
    await saved(page);
    await look(page, 'wizard-around');

    await choosePlan(page, trialId);
    await open(page, `/trials/${trialId}/start`);
    await look(page, 'wizard-start');
    await press(page, 'Send to engineer');
    await page.getByText(/still to do/).waitFor();
    const { plan } = await readAnswers(page, trialId);
    for (const { order } of plan?.hardest ?? []) await pick(page, `look-${order}`, 'runBefore');
    await saved(page);
    await press(page, 'Send to engineer');
    await page.getByText(/^Sam Okoro has it since/).waitFor();
    await look(page, 'wizard-start-waiting');

    const engineer = await openPage(at.browser);
    await signIn(engineer.page, at.running.url, 'engineer');
    await open(engineer.page, `/trials/${trialId}/review`);
    await look(engineer.page, 'review');
    await press(engineer.page, 'Send back');
    await engineer.page.getByText('Say at a line what must change. Then send it back.').waitFor();
    await engineer.page.evaluate(() => document.querySelector('h1')?.scrollIntoView());
    await press(engineer.page, 'Remark Stop rule');
    await engineer.page.keyboard.type('Add the odd sound');
    await press(engineer.page, 'Add the remark');
    await engineer.page.getByText('Add the odd sound').waitFor();
    await press(engineer.page, 'Send back');
    await engineer.page.getByText(/^Sam Okoro sent it back/).waitFor();
    await look(engineer.page, 'review-sent-back');

    await open(page, `/trials/${trialId}/start`);
    await page.getByText('Sam Okoro: Add the odd sound').waitFor();
    await look(page, 'wizard-start-sent-back');
    await press(page, 'Done with it');
    await page.getByText('Sam Okoro: Add the odd sound').waitFor({ state: 'detached' });
    for (const check of ['Guards are on', 'The crew', 'The box', 'There is enough', 'The gauge']) {
      await press(page, check, 'Space');
    }
    await saved(page);
    await press(page, 'Send to engineer');
    await page.getByText(/^Sam Okoro has it since/).waitFor();

    await open(engineer.page, `/trials/${trialId}/review`);
    await press(engineer.page, 'Approve');
    await engineer.page.getByRole('alertdialog').waitFor();
    await press(engineer.page, 'Approve');
    await engineer.page.getByText(/^Sam Okoro approved it/).waitFor();
    expect(engineer.complaints).toEqual([]);
    await engineer.close();

    await open(page, `/trials/${trialId}/start`);
    await press(page, 'Start the trial');
    await page.getByRole('alertdialog').waitFor();
    await takeShot(page, 'wizard-start-ask');
    await press(page, 'Start the trial');
    await page.getByText('The trial has started.').waitFor();
    expect((await readAnswers(page, trialId)).state).toBe('running');
    expect(complaints).toEqual([]);
    await close();
  });
});
