import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashToken } from '../../../src/server/auth/token.ts';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { findPersonOf, openAppDatabase, plantLink } from '../../setup/app-database.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const [dana, sam] = demoSignIns;
const goodPassword = 'soup pouches hold on tuesdays';
let running: RunningApp;
let db: Knex;
let danaId = '';
let shopId = '';
let visitors = 0;
beforeAll(async () => {
  running = await startApp({ env: { TRUST_PROXY: 'yes' } });
  db = openAppDatabase(running);
  ({ id: danaId, shopId } = await findPersonOf(db, dana.email));
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await running.stop();
});

function newVisitor(): Visitor {
  visitors += 1;
  return new Visitor(running.url, `198.51.100.${visitors}`);
}

/** What a link is for, and the address that takes it. */
const addresses = { invite: 'invite', reset: 'reset', setup: 'setup', operator: 't' } as const;
type Purpose = keyof typeof addresses;

const deadLinks = {
  unknown: () => Promise.resolve('AAAAAAAAAAAAAAAAAAAAAA'),
  used: (purpose: Purpose) => plantLink(db, { purpose, shopId, personId: danaId, columns: { used_at: 1 } }),
  revoked: (purpose: Purpose) =>
    plantLink(db, { purpose, shopId, personId: danaId, columns: { revoked_at: 1 } }),
  expired: (purpose: Purpose) =>
    plantLink(db, { purpose, shopId, personId: danaId, columns: { expires_at: Date.now() - 1 } }),
  'made for something else': () => plantLink(db, { purpose: 'share', shopId, personId: danaId }),
};

describe.each(Object.keys(addresses) as Purpose[])('a dead link (%s)', (purpose) => {
  it.each(Object.keys(deadLinks) as (keyof typeof deadLinks)[])('that is %s says only that', async (why) => {
    const token = await deadLinks[why](purpose);
    const before = await db('people').where({ id: danaId }).first('password_hash');
    const form = {
      password: goodPassword,
      shopName: 'Another shop',
      timeZone: 'UTC',
      language: 'en',
      currency: 'USD',
      name: 'Somebody',
      email: 'somebody@another.example',
    };
    for (const answer of [
      await newVisitor().get(`/${addresses[purpose]}/${token}`),
      await newVisitor().postForm(`/${addresses[purpose]}/${token}`, form),
    ]) {
      expect(answer.status).toBe(410);
      const page = await answer.text();
      expect(page).toContain('This link has ended');
      for (const whose of ['Dana', dana.email, 'Harrow Lane']) expect(page).not.toContain(whose);
    }
    expect(await db('people').where({ id: danaId }).first('password_hash')).toEqual(before);
    expect(await db('people').where({ email: form.email })).toEqual([]);
  });
});

describe('an invitation', () => {
  it('of somebody who was deactivated since is dead', async () => {
    const person = await findPersonOf(db, sam.email);
    const token = await plantLink(db, { purpose: 'invite', shopId, personId: person.id });
    expect((await newVisitor().get(`/invite/${token}`)).status).toBe(200);
    await db('people').where({ id: person.id }).update({ active: false });
    expect((await newVisitor().get(`/invite/${token}`)).status).toBe(410);
    await db('people').where({ id: person.id }).update({ active: true });
  });

  it('is not used up by looking, nor by a password that is refused', async () => {
    const token = await plantLink(db, { purpose: 'invite', shopId, personId: danaId });
    const visitor = newVisitor();
    for (let look = 0; look < 3; look += 1) {
      expect((await visitor.get(`/invite/${token}`)).status).toBe(200);
    }
    for (const password of [
      'too short',
      'harrow lane foods',
      'passwordpassword',
      'DANA@harrowlane.example',
    ]) {
      const answer = await visitor.postForm(`/invite/${token}`, { password });
      expect(answer.status).toBe(422);
      expect(await answer.text()).not.toContain(`value="${password}"`);
    }
    const answer = await visitor.postForm(`/invite/${token}`, { password: goodPassword });
    expect([answer.status, answer.headers.get('location')]).toEqual([303, '/']);
    expect((await visitor.get('/me')).status).toBe(200);
    expect((await newVisitor().signIn(dana.email, goodPassword)).status).toBe(303);
    expect((await newVisitor().get(`/invite/${token}`)).status).toBe(410);
  });

  it('that two open at the same moment lets one in', async () => {
    const token = await plantLink(db, { purpose: 'invite', shopId, personId: danaId });
    const racers = Array.from({ length: 6 }, newVisitor);
    const answers = await Promise.all(
      racers.map((racer, n) => racer.postForm(`/invite/${token}`, { password: `${goodPassword} ${n}` })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([303, 410, 410, 410, 410, 410]);
  });
});

describe('a reset link', () => {
  it('ends every other session of the person', async () => {
    const old = newVisitor();
    const invite = await plantLink(db, { purpose: 'invite', shopId, personId: danaId });
    await old.postForm(`/invite/${invite}`, { password: goodPassword });
    expect((await old.get('/me')).status).toBe(200);
    const token = await plantLink(db, { purpose: 'reset', shopId, personId: danaId });
    const visitor = newVisitor();
    await visitor.postForm(`/reset/${token}`, { password: 'the lids stay on from friday' });
    expect((await old.get('/me')).status).toBe(303);
    expect((await visitor.get('/me')).status).toBe(200);
    expect((await newVisitor().signIn(dana.email, goodPassword)).status).toBe(422);
  });

  it('leaves no token and no password behind in what is written down', async () => {
    const token = await plantLink(db, { purpose: 'reset', shopId, personId: danaId });
    await newVisitor().postForm(`/reset/${token}`, { password: 'never written down anywhere' });
    const written = [
      running.app.errors(),
      JSON.stringify(await db('activity').select()),
      JSON.stringify(await db('links').select()),
    ].join('\n');
    expect(written).toContain('password.reset');
    expect(written).toContain(hashToken(token));
    expect(written).not.toContain(token);
    expect(written).not.toContain('never written down anywhere');
  });
});
