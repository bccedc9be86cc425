import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { KeptMail } from '../../../src/fakes/mail/mailbox.ts';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { openAppDatabase } from '../../setup/app-database.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const [dana, sam, robin] = demoSignIns;
const hour = 3_600_000;
let running: RunningApp;
let db: Knex;
let visitors = 0;
beforeAll(async () => {
  running = await startApp({ standIns: true, env: { TRUST_PROXY: 'yes' } });
  db = openAppDatabase(running);
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await running.stop();
});

function newVisitor(): Visitor {
  visitors += 1;
  return new Visitor(running.url, `198.51.100.${visitors}`);
}

async function mailsTo(email: string): Promise<KeptMail[]> {
  const answer = await fetch(new URL('/fake/mails', String(running.mailUrl)));
  const mails = (await answer.json()) as KeptMail[];
  return mails.filter(({ recipients }) => recipients.includes(email));
}

/** Asks for a reset and waits for its mail; answers the path of the link in it. */
async function askAndRead(email: string): Promise<string> {
  const before = (await mailsTo(email)).length;
  expect((await newVisitor().postForm('/reset', { email })).status).toBe(303);
  const mail = await vi.waitFor(
    async () => {
      const mails = await mailsTo(email);
      expect(mails.length).toBe(before + 1);
      return mails[before];
    },
    { timeout: 15_000, interval: 100 },
  );
  return new URL(/https?:\S+\/reset\/[\w-]{22}/.exec(String(mail?.text))?.[0] ?? '').pathname;
}

describe('a forgotten password', () => {
  it('is replaced by a mailed link, once, and ends all sessions and older links', async () => {
    const signedIn = newVisitor();
    await signedIn.signIn(dana.email, dana.password);
    const older = await askAndRead(dana.email);
    const path = await askAndRead(dana.email);
    expect((await newVisitor().get(older)).status).toBe(200);

    const visitor = newVisitor();
    const page = await (await visitor.get(path)).text();
    expect(page).toContain('Choose a new password');
    const password = 'the lids stay on from friday';
    expect((await visitor.postForm(path, { password })).status).toBe(303);
    expect((await visitor.get('/me')).status).toBe(200);
    expect((await signedIn.get('/me')).status).toBe(303);
    for (const dead of [path, older]) expect((await newVisitor().get(dead)).status).toBe(410);
    expect((await newVisitor().signIn(dana.email, dana.password)).status).toBe(422);
    expect((await newVisitor().signIn(dana.email, password)).status).toBe(303);
  });

  it('works for an hour', async () => {
    const path = await askAndRead(sam.email);
    running.moveClock(hour + 1_000);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect((await newVisitor().get(path)).status).toBe(410);
    running.moveClock(0);
    await new Promise((resolve) => setTimeout(resolve, 300));
  });

  it('gets the same answer, as fast, for an address that nobody has', async () => {
    const answers = [];
    for (const email of [robin.email, 'nobody@harrowlane.example', 'ana@harrowlane.example']) {
      const began = performance.now();
      const answer = await newVisitor().postForm('/reset', { email });
      expect(performance.now() - began).toBeGreaterThan(245);
      answers.push([answer.status, answer.headers.get('location'), await answer.text()]);
    }
    expect(answers[1]).toEqual(answers[0]);
    expect(answers[2]).toEqual(answers[0]);
    const page = await (await newVisitor().get('/reset?sent=1')).text();
    expect(page).toContain('If this address signs in here, a mail is on its way.');
  });

  it('may be asked for five times an hour, for any address alike', async () => {
    for (const email of [sam.email, 'nobody.else@harrowlane.example']) {
      const statuses = [];
      for (let ask = 0; ask < 6; ask += 1) {
        statuses.push((await newVisitor().postForm('/reset', { email })).status);
      }
      // Sam asked once before.
      expect(statuses.filter((status) => status === 429)).toHaveLength(email === sam.email ? 2 : 1);
      const refused = await newVisitor().postForm('/reset', { email });
      expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(3_000);
      expect(await refused.text()).toContain('before you ask again');
    }
  });

  it('leaves its token nowhere once the mail is out', async () => {
    const token = (await askAndRead(robin.email)).slice('/reset/'.length);
    await vi.waitFor(
      async () => {
        const messages = JSON.stringify(await db('messages').where({ template: 'reset' }).select());
        expect(messages).not.toContain(token);
      },
      { timeout: 10_000 },
    );
    expect(running.app.errors()).not.toContain(token);
    expect(JSON.stringify(await db('activity').select())).not.toContain(token);
  });
});
