import { readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { languages } from '../../src/i18n/languages.ts';
import { demoSignIns } from '../../src/server/demo-sign-ins.ts';
import {
  findAccessFaults,
  launchBrowser,
  openAwake,
  openPage,
  takeShot,
  type WatchedPage,
} from '../setup/browser.ts';
import { addDraft } from '../setup/draft-trial.ts';
import { type RunningApp, startApp } from '../setup/running-app.ts';
import { addRunningTrial } from '../setup/running-trial.ts';
import { signIn } from '../setup/sign-in.ts';
import { Visitor } from '../setup/visitor.ts';

/** Who opens the page, and at which address; `:personId` stands for somebody of the demo shop, `:trialId` for a draft, `:runningId` for a trial that runs. */
interface Visit {
  file: string;
  path: string;
  as: 'nobody' | 'admin' | 'supervisor' | 'engineer';
  /** The status to expect where it is not 200. */
  status?: number;
  /** Paper of a fixed size, which a narrow window scrolls. */
  isPaper?: true;
}

const visits: Visit[] = [
  { file: 'index.astro', path: '/', as: 'nobody' },
  { file: '404.astro', path: '/no/such/page', as: 'nobody', status: 404 },
  { file: 'refused.astro', path: '/refused', as: 'admin', status: 404 },
  { file: 'pieces/index.astro', path: '/pieces', as: 'nobody' },
  { file: 'pieces/paper.astro', path: '/pieces/paper', as: 'nobody', isPaper: true },
  { file: 'pieces/question.astro', path: '/pieces/question', as: 'nobody' },
  { file: 'sign-in.astro', path: '/sign-in', as: 'nobody' },
  { file: 'reset/index.astro', path: '/reset', as: 'nobody' },
  { file: 'reset/[token].astro', path: '/reset/a-link-that-never-was', as: 'nobody', status: 410 },
  { file: 'invite/[token].astro', path: '/invite/a-link-that-never-was', as: 'nobody', status: 410 },
  { file: 'setup/[token].astro', path: '/setup/a-link-that-never-was', as: 'nobody', status: 410 },
  { file: 't/[token].astro', path: '/t/a-link-that-never-was', as: 'nobody', status: 410 },
  { file: 's/[token].astro', path: '/s/a-link-that-never-was', as: 'nobody', status: 410 },
  { file: 'me.astro', path: '/me', as: 'admin' },
  { file: 'trials/index.astro', path: '/trials', as: 'admin' },
  { file: 'trials/[id]/verdict.astro', path: '/trials/none/verdict', as: 'admin', status: 404 },
  { file: 'trials/[id]/card.astro', path: '/trials/none/card', as: 'admin', status: 404 },
  { file: 'trials/machine.astro', path: '/trials/machine?name=Line%203', as: 'admin' },
  { file: 'trials/[id]/report.astro', path: '/trials/none/report', as: 'admin', status: 404 },
  { file: 'people/index.astro', path: '/people', as: 'admin' },
  { file: 'people/new.astro', path: '/people/new', as: 'admin' },
  { file: 'people/[id].astro', path: '/people/:personId', as: 'admin' },
  { file: 'people/import.astro', path: '/people/import', as: 'admin' },
  { file: 'shop/index.astro', path: '/shop', as: 'admin' },
  { file: 'shop/texts-check.astro', path: '/shop/texts-check', as: 'admin' },
  { file: 'shop/poster.astro', path: '/shop/poster', as: 'admin' },
  { file: 'activity.astro', path: '/activity', as: 'admin' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/problem', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/today', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/settings', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/safety', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/around', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/start', as: 'supervisor' },
  { file: 'trials/[id]/board.astro', path: '/trials/:runningId/board', as: 'supervisor' },
  { file: 'trials/[id]/paper.astro', path: '/trials/:runningId/paper', as: 'supervisor', isPaper: true },
  { file: 'trials/[id]/review.astro', path: '/trials/:trialId/review', as: 'supervisor' },
  { file: 'interface.astro', path: '/interface?find=verdict', as: 'engineer' },
  { file: 'trials/[id]/audit/index.astro', path: '/trials/:runningId/audit', as: 'engineer' },
  { file: 'trials/[id]/audit/data.astro', path: '/trials/:runningId/audit/data', as: 'engineer' },
  { file: 'trials/[id]/audit/model.astro', path: '/trials/:runningId/audit/model', as: 'engineer' },
  { file: 'trials/[id]/audit/checks.astro', path: '/trials/:runningId/audit/checks', as: 'engineer' },
  { file: 'trials/[id]/audit/prediction.astro', path: '/trials/:runningId/audit/prediction', as: 'engineer' },
  { file: 'trials/[id]/audit/check-runs.astro', path: '/trials/:runningId/audit/check-runs', as: 'engineer' },
  { file: 'trials/[id]/audit/models.astro', path: '/trials/:runningId/audit/models', as: 'engineer' },
  { file: 'trials/[id]/audit/sign-off.astro', path: '/trials/:runningId/audit/sign-off', as: 'engineer' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/plan', as: 'supervisor' },
  { file: 'trials/[id]/[step].astro', path: '/trials/:trialId/crew', as: 'supervisor' },
];

/** Pages with no look of their own: one only answers a form, one shows when the product itself fails. */
const unseen = ['sign-out.astro', '500.astro'];

const pagesFolder = fileURLToPath(new URL('../../src/pages/', import.meta.url));
const views = [
  { width: 1280, colorScheme: 'light' },
  { width: 1280, colorScheme: 'dark' },
  { width: 360, colorScheme: 'dark' },
  { width: 360, colorScheme: 'light' },
] as const;

let running: RunningApp;
let browser: Browser;
let visitors: Record<Visit['as'], WatchedPage>;
let trialId: string;
let runningId: string;
beforeAll(async () => {
  running = await startApp({ standIns: true });
  browser = await launchBrowser();
  visitors = {
    nobody: await openPage(browser),
    admin: await openPage(browser),
    supervisor: await openPage(browser),
    engineer: await openPage(browser),
  };
  await signIn(visitors.admin.page, running.url, 'admin');
  await signIn(visitors.supervisor.page, running.url, 'supervisor');
  await signIn(visitors.engineer.page, running.url, 'engineer');
  runningId = await addRunningTrial(running);
  trialId = await addDraft(visitors.supervisor.page, running.url);
});
afterAll(async () => {
  await browser?.close();
  await running?.stop();
});

/** What its pictures are called. */
function nameOf({ file, path }: Visit): string {
  const step = file.includes('[step]') ? path.split('/').pop() : '';
  return `${file.replace(/\W+/g, '-')}${step}`;
}

/** Opens the page as its visitor and answers the status. */
async function open(visit: Visit): Promise<number | undefined> {
  const { page } = visitors[visit.as];
  let path = visit.path.replace(':trialId', trialId).replace(':runningId', runningId);
  if (path.includes(':personId')) {
    await page.goto(`${running.url}/people`);
    path = (await page.locator('a[href^="/people/0"]').first().getAttribute('href')) ?? path;
  }
  return openAwake(page, `${running.url}${path}`);
}

describe('every page', () => {
  it('is visited below', () => {
    const files = readdirSync(pagesFolder, { recursive: true, encoding: 'utf8' }).filter((file) =>
      file.endsWith('.astro'),
    );
    expect(files.sort()).toEqual([...new Set([...unseen, ...visits.map((visit) => visit.file)])].sort());
  });

  it.each(visits)('$path is open to everybody who sees, hears or only uses keys', async (visit) => {
    const { page, complaints } = visitors[visit.as];
    expect(await open(visit)).toBe(visit.status ?? 200);
    for (const { width, colorScheme } of views) {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.setViewportSize({ width, height: 800 });
      const rules = colorScheme === 'dark' ? ['color-contrast'] : null;
      expect(await findAccessFaults(page, rules), `${width} px, ${colorScheme}`).toEqual([]);
      const sticksOut = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      if (!visit.isPaper) expect(sticksOut, `${width} px`).toBeLessThanOrEqual(0);
      await takeShot(page, `${nameOf(visit)}-${width}-${colorScheme}`);
    }
    expect(complaints.splice(0)).toEqual([]);
  });

  it.each(languages)('speaks to whoever is not signed in as their cookie asks (%s)', async (language) => {
    const visitor = new Visitor(running.url);
    visitor.setCookie('language', language);
    // The sheets of pieces are for developers and speak English only.
    const read = visits.filter(({ as, path }) => as === 'nobody' && !path.startsWith('/pieces'));
    for (const { path } of read) expect(await languageOf(visitor, path), path).toBe(language);
  });

  it('switches the language of a person who is signed in, everywhere and for good', async () => {
    const visitor = new Visitor(running.url);
    const admin = demoSignIns.find(({ role }) => role === 'admin');
    await visitor.signIn(admin?.email ?? '', admin?.password ?? '');
    for (const language of [...languages].reverse()) {
      await visitor.postForm('/language', { language });
      for (const { path, status } of visits.filter(({ as, path }) => as === 'admin' && !path.includes(':')))
        expect(await languageOf(visitor, path, status), path).toBe(language);
    }
  });
});

/** The language that the page says it is in; what a script would add is not waited for. */
async function languageOf(visitor: Visitor, path: string, status?: number): Promise<string | undefined> {
  const answer = await visitor.get(path);
  if (status !== undefined) expect(answer.status, path).toBe(status);
  return /<html[^>]* lang="([^"]+)"/.exec(await answer.text())?.[1];
}
