import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const [dana, sam, robin] = demoSignIns;
const second = 1_000;
let running: RunningApp;
let movedTo = 0;
beforeAll(async () => {
  running = await startApp({ env: { TRUST_PROXY: 'yes' } });
}, 60_000);
afterAll(() => running.stop());

async function passTime(milliseconds: number): Promise<void> {
  movedTo += milliseconds;
  running.moveClock(movedTo);
  // The app looks at the clock's file every 200 ms.
  await new Promise((resolve) => setTimeout(resolve, 300));
}

/** Uses up the five tries of a minute and answers the sixth. */
async function tryTooOften(visitor: Visitor, email: string): Promise<Response> {
  for (let tries = 0; tries < 5; tries += 1) {
    expect((await visitor.signIn(email, 'a wrong password')).status).toBe(422);
  }
  return visitor.signIn(email, 'a wrong password');
}

describe('too many tries to sign in', () => {
  it('make sign-in rest, longer each time up to a quarter of an hour, and lock nobody out', async () => {
    const visitor = new Visitor(running.url, '203.0.113.1');
    for (const minutes of [1, 2, 4, 8, 15, 15]) {
      const refused = await tryTooOften(visitor, dana.email);
      expect([refused.status, refused.headers.get('retry-after')]).toEqual([429, String(minutes * 60)]);
      expect(await refused.text()).toContain(`Sign-in rests for ${minutes} minute`);
      // Neither the right password nor more tries change how long it rests.
      expect((await visitor.signIn(dana.email, dana.password)).status).toBe(429);
      await passTime(minutes * 60 * second);
    }
    expect((await visitor.signIn(dana.email, dana.password)).status).toBe(303);
    const afresh = await tryTooOften(visitor, dana.email);
    expect(afresh.headers.get('retry-after')).toBe('60');
  });

  it('count for that address from that network alone', async () => {
    const visitor = new Visitor(running.url, '203.0.113.2');
    expect((await tryTooOften(visitor, sam.email)).status).toBe(429);
    expect((await visitor.signIn(robin.email, robin.password)).status).toBe(303);
    const elsewhere = new Visitor(running.url, '203.0.113.3');
    expect((await elsewhere.signIn(sam.email, sam.password)).status).toBe(303);
  });

  it('count for addresses that nobody has, too', async () => {
    const visitor = new Visitor(running.url, '203.0.113.4');
    expect((await tryTooOften(visitor, 'nobody@harrowlane.example')).status).toBe(429);
  });

  it('count all together when they come at once', async () => {
    const visitor = new Visitor(running.url, '203.0.113.5');
    const answers = await Promise.all(
      Array.from({ length: 12 }, () => visitor.signIn(dana.email, 'a wrong password')),
    );
    expect(answers.filter(({ status }) => status === 422)).toHaveLength(5);
    expect(answers.filter(({ status }) => status === 429)).toHaveLength(7);
  });

  it('are counted by the address that the proxy saw, whatever the sender claims', async () => {
    const claims = Array.from({ length: 6 }, (_, index) => `192.0.2.${index}, 203.0.113.6`);
    const statuses = [];
    for (const claim of claims) {
      const answer = await new Visitor(running.url, claim).signIn(sam.email, 'a wrong password');
      statuses.push(answer.status);
    }
    expect(statuses).toEqual([422, 422, 422, 422, 422, 429]);
  });
});

describe('links', () => {
  it('may be opened thirty times a minute from one network', async () => {
    const visitor = new Visitor(running.url, '203.0.113.7');
    const statuses = await Promise.all(
      Array.from({ length: 31 }, async () => (await visitor.get('/invite/no-such-link')).status),
    );
    expect(statuses.filter((status) => status === 410)).toHaveLength(30);
    const refused = await visitor.get('/reset/no-such-link');
    expect(refused.status).toBe(429);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
    expect(await refused.text()).toContain('Try again in 1 minute.');
    await passTime(61 * second);
    expect((await visitor.get('/reset/no-such-link')).status).toBe(410);
  });
});
