import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashToken } from '../../../src/server/auth/token.ts';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { openAppDatabase } from '../../setup/app-database.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const [dana, sam, robin] = demoSignIns;
let running: RunningApp;
let db: Knex;
beforeAll(async () => {
  running = await startApp({ env: { TRUST_PROXY: 'yes', LOG_LEVEL: 'debug' } });
  db = openAppDatabase(running);
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await running.stop();
});

let networks = 0;
/** Each visitor from a network of its own, so that no test meets another's rate limit. */
function newVisitor(): Visitor {
  networks += 1;
  return new Visitor(running.url, `198.51.100.${networks}`);
}

async function wordsOf(answer: Response): Promise<string> {
  return (await answer.text()).replace(/<[^>]*>/g, ' ').replace(/\s+/g, ' ');
}

describe('signing in', () => {
  it('sends each role to its own start page', async () => {
    for (const [person, start] of [
      [dana, '/trials'],
      [sam, '/trials'],
      [robin, '/people'],
    ] as const) {
      const visitor = newVisitor();
      const answer = await visitor.signIn(person.email, person.password);
      expect([answer.status, answer.headers.get('location')]).toEqual([303, '/']);
      const front = await visitor.get('/');
      expect([front.status, front.headers.get('location')]).toEqual([303, start]);
    }
  });

  it('takes the mail address in capital letters and with spaces around it', async () => {
    expect((await newVisitor().signIn(` ${dana.email.toUpperCase()} `, dana.password)).status).toBe(303);
  });

  it('says the same of a wrong password, an unknown address and an invited person', async () => {
    const { shop_id } = await db('people').where({ email: dana.email }).first('shop_id');
    await db('people').where({ shop_id, name: 'Lee Abbott' }).update({ email: 'lee@harrowlane.example' });
    const pages = [];
    for (const email of [dana.email, 'nobody@harrowlane.example', 'lee@harrowlane.example']) {
      const answer = await newVisitor().signIn(email, 'not the right password');
      expect(answer.status).toBe(422);
      expect(answer.headers.getSetCookie()).toEqual([]);
      // Without the demo's own buttons, which hold addresses too.
      const [page = ''] = (await answer.text()).split('<section');
      pages.push(page.replace(email, ''));
    }
    expect(pages[1]).toBe(pages[0]);
    expect(pages[2]).toBe(pages[0]);
    expect(pages[0]).toContain('The mail address and the password do not go together.');
  });

  it('refuses somebody who was deactivated with the same words', async () => {
    const visitor = newVisitor();
    await visitor.signIn(sam.email, sam.password);
    await db('people').where({ email: sam.email }).update({ active: false });
    expect((await newVisitor().signIn(sam.email, sam.password)).status).toBe(422);
    expect((await visitor.get('/me')).headers.get('location')).toBe('/sign-in?next=%2Fme');
    await db('people').where({ email: sam.email }).update({ active: true });
  });

  it('keeps the address that was typed, and never a password', async () => {
    const answer = await newVisitor().signIn(dana.email, 'not-the-right-one');
    const page = await answer.text();
    expect(page).toContain(`value="${dana.email}"`);
    expect(page).not.toContain('not-the-right-one');
  });

  it('says at the field what is missing', async () => {
    const answer = await newVisitor().signIn('dana', '');
    expect(answer.status).toBe(422);
    const words = await wordsOf(answer);
    expect(words).toContain('This is not a mail address, like name@firm.example.');
    expect(words).toContain('Please fill this in.');
  });

  it.each([
    ['/me?done=settings', '/me?done=settings'],
    ['https://other.example/', '/'],
    ['//other.example/', '/'],
    ['/\\other.example', '/'],
    ['javascript:alert(1)', '/'],
  ])('goes on to %s only if it is ours', async (next, expected) => {
    const answer = await newVisitor().signIn(dana.email, dana.password, next);
    expect(answer.headers.get('location')).toBe(expected);
  });
});

describe('a session', () => {
  it('has a cookie that scripts and other sites cannot use', async () => {
    const answer = await newVisitor().signIn(dana.email, dana.password);
    const [cookie = ''] = answer.headers.getSetCookie();
    expect(cookie).toMatch(/^session=[\w]+;/);
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
  });

  it('never takes over an id that was there before', async () => {
    const visitor = newVisitor();
    const planted = 'planted000000000000000000000000000000000';
    visitor.setCookie('session', planted);
    await visitor.signIn(dana.email, dana.password);
    expect(visitor.sessionId).toBeDefined();
    expect(visitor.sessionId).not.toBe(planted);
    expect(await db('sessions').where({ id_hash: hashToken(planted) })).toEqual([]);
  });

  it('replaces the one this browser had', async () => {
    const visitor = newVisitor();
    await visitor.signIn(dana.email, dana.password);
    const first = String(visitor.sessionId);
    await visitor.signIn(dana.email, dana.password);
    expect(visitor.sessionId).not.toBe(first);
    expect(await db('sessions').where({ id_hash: hashToken(first) })).toEqual([]);
  });

  it('is kept as a hash only', async () => {
    const visitor = newVisitor();
    await visitor.signIn(dana.email, dana.password);
    const everything = JSON.stringify(await db('sessions').select());
    expect(everything).not.toContain(String(visitor.sessionId));
    expect(everything).toContain(hashToken(String(visitor.sessionId)));
  });

  it('ends by signing out, and stays dead when its cookie comes back', async () => {
    const visitor = newVisitor();
    await visitor.signIn(dana.email, dana.password);
    const old = String(visitor.sessionId);
    expect((await visitor.get('/sign-out')).status).toBe(200);
    expect((await visitor.get('/me')).headers.get('cache-control')).toBe('no-store');
    const answer = await visitor.postForm('/sign-out', {});
    expect([answer.status, visitor.sessionId]).toEqual([303, undefined]);
    visitor.setCookie('session', old);
    expect((await visitor.get('/me')).headers.get('location')).toBe('/sign-in?next=%2Fme');
  });

  it('ends everywhere at once', async () => {
    const [here, there] = [newVisitor(), newVisitor()];
    await here.signIn(robin.email, robin.password);
    await there.signIn(robin.email, robin.password);
    expect((await there.get('/me')).status).toBe(200);
    const answer = await here.postForm('/me', { do: 'end-all' });
    expect(answer.headers.get('location')).toBe('/sign-in');
    for (const visitor of [here, there]) {
      expect((await visitor.get('/me')).headers.get('location')).toBe('/sign-in?next=%2Fme');
    }
  });

  it('lasts two weeks by the product’s clock, longer when it is used', async () => {
    const day = 86_400_000;
    const visitor = newVisitor();
    await visitor.signIn(dana.email, dana.password);
    const idle = newVisitor();
    await idle.signIn(dana.email, dana.password);
    const wait = () => new Promise((resolve) => setTimeout(resolve, 300));
    running.moveClock(10 * day);
    await wait();
    expect((await visitor.get('/me')).status).toBe(200);
    running.moveClock(15 * day);
    await wait();
    expect((await visitor.get('/me')).status).toBe(200);
    expect((await idle.get('/me')).status).toBe(303);
    running.moveClock(0);
    await wait();
  });
});

describe('what is written down', () => {
  it('holds no password, no session id and no mail address, in the log or in the activity', async () => {
    const visitor = newVisitor();
    await visitor.signIn(dana.email, dana.password);
    await visitor.signIn(dana.email, 'a wrong password of hers');
    const sessionIds = [visitor.sessionId].map(String);
    const activity = JSON.stringify(await db('activity').select());
    const limits = JSON.stringify(await db('rate_limits').select());
    expect(activity).toContain('session.started');
    expect(limits).toContain('sign-in:');
    const written = [running.app.errors(), activity, limits].join('\n');
    for (const secret of [
      ...sessionIds,
      dana.password,
      'a wrong password of hers',
      dana.email,
      '198.51.100.',
    ]) {
      expect(written).not.toContain(secret);
    }
  });
});
