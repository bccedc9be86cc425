import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createMailGateway } from '../../src/features/message/mail-gateway.ts';
import { createTwilioGateway } from '../../src/features/message/twilio-gateway.ts';
import { type StandIns, startStandIns, testAccount } from '../integration/stand-ins.ts';
import { findAccessFaults, launchBrowser, openPage, takeShot } from '../setup/browser.ts';

// Nobody listens there: webhooks are missed, which is a state of the page worth looking at too.
const publicUrl = 'http://127.0.0.1:9';
const number = '+12025550100';
const phone = '+12025550142';
const conversation = `/phones/${encodeURIComponent(phone)}/${encodeURIComponent(number)}`;
const prompt =
  'Line 3, run 4 of 11\nJAW TEMP 160\nDWELL 0.9\nPRESS 3.5\nFILM B\nWait 5 min. Bin 10. Make 50, mark HOLD.\n' +
  'Text 3 strengths: 41.5 40.8 42\nDanger: stop machine, text DANGER\nhttp://127.0.0.1:9/t/AbCdEfGhIjKlMnOpQrStUv';

let browser: Browser;
let standIns: StandIns;

async function sendText(to: string, body: string): Promise<void> {
  const settings = { ...testAccount, apiUrl: standIns.textsUrl, publicUrl };
  const gateway = createTwilioGateway(settings, () => Date.now());
  expect(await gateway.send({ messageId: 'm', from: number, to, body })).toMatchObject({
    outcome: 'accepted',
  });
}

beforeAll(async () => {
  browser = await launchBrowser();
  standIns = await startStandIns(publicUrl, {
    phones: [
      { phone, name: 'Ana' },
      { phone: '+12025550168', name: 'Minh' },
    ],
    numbers: [number],
  });
  await sendText(phone, prompt);
  await standIns.textFromPhone({ from: phone, to: number, body: '41.5 40,8 42' });
  await sendText('+12025550155', 'Đặt nhiệt độ kẹp 160, rồi gửi kết quả. '.repeat(4));
  await standIns.textFromPhone({ from: '+12025550155', to: number, body: 'STOP' });
  const mails = createMailGateway({
    host: '127.0.0.1',
    port: standIns.smtpPort,
    secure: false,
    requireTls: false,
    from: { name: 'Trywell', address: 'trywell@harrowlane.example' },
  });
  const to = { name: 'Sam', address: 'sam@harrowlane.example' };
  await mails.send({
    messageId: '1',
    to,
    subject: 'Dana invites you',
    text: `Open ${publicUrl}/invite/abc\n\nThanks`,
  });
  mails.close();
});
afterAll(async () => {
  await browser.close();
  await standIns.stop();
});

describe.each([
  ['wide', 1280, 800],
  ['phone', 360, 740],
])('on a %s screen', (screen, width, height) => {
  it.each(['light', 'dark'] as const)('every page is accessible and fits, in %s', async (colorScheme) => {
    const mail = (await standIns.mails())[0]?.id;
    const pages = {
      phones: '/phones',
      conversation,
      'opted-out': conversation.replace('0142', '0155'),
      empty: conversation.replace('0142', '0168'),
      mail: '/mail',
      'open-mail': `/mail/${mail}`,
      webhooks: '/webhooks',
    };
    const { page, complaints, close } = await openPage(browser, { viewport: { width, height }, colorScheme });
    for (const [name, path] of Object.entries(pages)) {
      await page.goto(standIns.textsUrl + path);
      expect([name, await findAccessFaults(page)]).toEqual([name, []]);
      expect([name, await page.evaluate(() => document.documentElement.scrollWidth)]).toEqual([name, width]);
      await takeShot(page, `stand-ins-${name}-${screen}-${colorScheme}`);
    }
    expect(complaints).toEqual([]);
    await close();
  });
});

describe('a phone on the page', () => {
  it('shows a new text by itself, keeps what is being typed, and answers with Enter', async () => {
    const { page, complaints, close } = await openPage(browser);
    await page.goto(standIns.textsUrl + conversation);
    const field = page.getByLabel('Answer as Ana');
    await field.fill('half a thought');
    await sendText(phone, 'Run 4 saved. Next: run 5.');
    await page.getByRole('log').getByText('Run 4 saved. Next: run 5.').waitFor({ timeout: 8000 });
    expect(await field.inputValue()).toBe('half a thought');
    await field.fill('DONE');
    await field.press('Enter');
    await page.getByRole('log').getByText('DONE', { exact: true }).waitFor();
    const texts = await standIns.texts();
    expect(texts.at(-1)).toMatchObject({ direction: 'inbound', from: phone, to: number, body: 'DONE' });
    expect(complaints).toEqual([]);
    await close();
  });

  it('works without scripts', async () => {
    const { page, close } = await openPage(browser, { javaScriptEnabled: false });
    await page.goto(standIns.textsUrl + conversation);
    await page.getByLabel('Answer as Ana').fill('SKIP');
    await page.getByRole('button', { name: 'Send' }).click();
    await page.getByRole('log').getByText('SKIP', { exact: true }).waitFor();
    await close();
  });
});
