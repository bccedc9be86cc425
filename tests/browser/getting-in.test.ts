import { execFile } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { openPage, type WatchedPage } from '../setup/browser.ts';

const at = withAppInBrowser({ standIns: true });
const shopCommand = fileURLToPath(new URL('../../src/commands/shop.ts', import.meta.url));

const shopNumber = '+12025550190';
const operatorPhone = '+12025550191';
const admin = { name: 'Jo Field', email: 'jo@millrow.example', password: 'four plain words of hers' };
const engineer = { name: 'Kit Marsh', email: 'kit@millrow.example' };
const passwords = { first: 'a kettle under the stairs', second: 'two boats and one long oar' };

/** The link that the server's terminal prints for a new shop. */
async function announceShop(name: string): Promise<string> {
  const { stdout } = await promisify(execFile)(
    process.execPath,
    ['--import', 'tsx', shopCommand, 'add', name],
    {
      env: {
        PATH: process.env['PATH'] ?? '',
        DATA_DIR: at.running.dataDir,
        APP_URL: at.running.url,
        LOG_LEVEL: 'silent',
      },
    },
  );
  return /http\S+\/setup\/\S+/.exec(stdout)?.[0] ?? '';
}

async function ask<Answer>(path: string, body?: object): Promise<Answer> {
  const answer = await fetch(new URL(path, at.running.textsUrl ?? ''), {
    ...(body
      ? { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) }
      : {}),
  });
  return (body ? undefined : await answer.json()) as Answer;
}

async function textsTo(phone: string): Promise<string[]> {
  const texts = await ask<{ to: string; body: string }[]>('/fake/texts');
  return texts.filter(({ to }) => to === phone).map(({ body }) => body);
}

/** The newest link of that kind in a mail to this address. */
async function linkMailedTo(address: string, kind: 'invite' | 'reset'): Promise<string> {
  let link = '';
  await expect
    .poll(
      async () => {
        const mails = JSON.stringify(
          (await ask<object[]>('/fake/mails')).filter((mail) => JSON.stringify(mail).includes(address)),
        );
        link = [...mails.matchAll(new RegExp(`http[^\\s"\\\\<]+/${kind}/[\\w-]+`, 'g'))].at(-1)?.[0] ?? '';
        return link;
      },
      { timeout: 15_000 },
    )
    .not.toBe('');
  return link;
}

async function submit(page: Page): Promise<void> {
  await Promise.all([page.waitForLoadState('networkidle'), page.click('main form button[type=submit]')]);
  await page.waitForLoadState('networkidle');
}

async function signIn(page: Page, person: { email: string; password: string }): Promise<void> {
  await page.goto(`${at.running.url}/sign-in`);
  await page.fill('input[name=email]', person.email);
  await page.fill('input[name=password]', person.password);
  await page.click('main button[type=submit]');
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

async function addPerson(
  page: Page,
  person: { name: string; roles: string[]; email?: string; phone?: string },
) {
  await page.goto(`${at.running.url}/people/new`, { waitUntil: 'networkidle' });
  await page.fill('[name=name]', person.name);
  for (const role of ['operator', 'supervisor', 'engineer', 'admin']) {
    await page.setChecked(`[name=roles][value=${role}]`, person.roles.includes(role));
  }
  if (person.email) await page.fill('[name=email]', person.email);
  if (person.phone) await page.fill('[name=phone]', person.phone);
  await page.fill('[name="hours.0.from"]', '0');
  await page.fill('[name="hours.0.to"]', '0');
  for (const day of ['1', '2', '3', '4', '5', '6', '7'])
    await page.check(`[name="hours.0.days"][value="${day}"]`);
  await page.click('main form button[type=submit]');
  await page.waitForURL(/\/people\/0/);
}

/** A browser of its own, as if on another machine. */
function openElsewhere(): Promise<WatchedPage> {
  return openPage(at.browser);
}

describe('getting in', { timeout: 180_000 }, () => {
  it('goes from the set-up link to invited people, by mail and by text, and out again', async () => {
    const desk = await openElsewhere();
    const link = await announceShop('Mill Row Bakery');
    await desk.page.goto(link);
    await desk.page.fill('[name=name]', admin.name);
    await desk.page.fill('[name=email]', admin.email);
    await desk.page.fill('[name=password]', admin.password);
    await submit(desk.page);
    expect(new URL(desk.page.url()).pathname).toBe('/people');
    expect((await desk.page.goto(link))?.status()).toBe(410);

    await desk.page.goto(`${at.running.url}/shop`, { waitUntil: 'networkidle' });
    await desk.page.fill('[name=textNumber]', shopNumber);
    await submit(desk.page);

    await addPerson(desk.page, { name: 'Ola Reed', roles: ['operator'], phone: operatorPhone });
    await expect.poll(() => textsTo(operatorPhone), { timeout: 15_000 }).toHaveLength(1);
    await ask('/fake/texts', { from: operatorPhone, to: shopNumber, body: 'OK' });
    await expect.poll(() => textsTo(operatorPhone), { timeout: 15_000 }).toHaveLength(2);
    await ask('/fake/texts', { from: operatorPhone, to: shopNumber, body: '41.5' });
    await expect.poll(() => textsTo(operatorPhone), { timeout: 15_000 }).toHaveLength(3);

    await addPerson(desk.page, { name: engineer.name, roles: ['engineer'], email: engineer.email });
    const invited = await openElsewhere();
    await invited.page.goto(await linkMailedTo(engineer.email, 'invite'));
    await invited.page.fill('input[type=password]', passwords.first);
    await submit(invited.page);

    await signIn((await openElsewhere()).page, { ...engineer, password: passwords.first });
    expect((await invited.page.goto(`${at.running.url}/shop`))?.status()).toBe(403);
    await invited.page.goto(`${at.running.url}/me`);
    await invited.page.locator('.head-menu summary').first().click();
    await invited.page.locator('button[name=language][value=pl]').click();
    await invited.page.waitForLoadState('networkidle');
    expect(await invited.page.locator('html').getAttribute('lang')).toBe('pl');

    const forgetful = await openElsewhere();
    await forgetful.page.goto(`${at.running.url}/reset`);
    await forgetful.page.fill('[name=email]', engineer.email);
    await submit(forgetful.page);
    await forgetful.page.goto(await linkMailedTo(engineer.email, 'reset'));
    await forgetful.page.fill('input[type=password]', passwords.second);
    await submit(forgetful.page);
    await invited.page.goto(`${at.running.url}/me`);
    expect(new URL(invited.page.url()).pathname).toBe('/sign-in');

    const [one, other] = [await openElsewhere(), await openElsewhere()];
    await signIn(one.page, { ...engineer, password: passwords.second });
    await signIn(other.page, { ...engineer, password: passwords.second });
    await one.page.goto(`${at.running.url}/me`);
    await one.page.click('button[value=end-all]');
    await one.page.waitForLoadState('networkidle');
    await other.page.goto(`${at.running.url}/me`);
    expect(new URL(other.page.url()).pathname).toBe('/sign-in');

    for (const watched of [desk, invited, forgetful, one, other]) expect(watched.complaints).toEqual([]);
  });
});
