import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openAppDatabase } from '../../setup/app-database.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const publicUrl = 'https://trials.example';
let running: RunningApp;
let db: Knex;
let localUrl = '';
let path = '';
beforeAll(async () => {
  running = await startApp({
    env: {
      APP_MODE: 'live',
      APP_URL: publicUrl,
      APP_SECRET: 'a secret of at least thirty-two letters',
      SMTP_HOST: '127.0.0.1',
      MAIL_FROM: 'trywell@trials.example',
      CLOCK_OFFSET_FILE: '',
    },
  });
  db = openAppDatabase(running);
  localUrl = running.url;
  path = new URL(String(running.app.ready['setUpUrl'])).pathname;
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await running.stop();
});

/** Asks at the local address as the proxy in front of it would. */
function newVisitor(): Visitor {
  return new Visitor(localUrl, undefined, publicUrl);
}

const answers = {
  shopName: 'Bolt and Nut',
  timeZone: 'Europe/Warsaw',
  language: 'pl',
  currency: 'PLN',
  name: 'Jan Nowak',
  email: 'Jan@Bolt.example',
  password: 'sruby trzymaja od srody',
};

describe('an empty live installation', () => {
  it('tells whoever started it where to set it up, and nobody else anything', async () => {
    expect(running.app.ready['setUpUrl']).toMatch(/^https:\/\/trials\.example\/setup\/[\w-]{22}$/);
    expect(running.app.ready['signIns']).toBeUndefined();
    expect(running.app.errors()).not.toContain(path);
    const page = await (await newVisitor().get('/sign-in')).text();
    expect(page).not.toContain('harrowlane');
    expect(page).not.toContain('/setup/');
  });

  it('keeps what was typed, but the password, when an answer is refused', async () => {
    const refused = await newVisitor().postForm(path, { ...answers, email: 'jan', currency: 'XXX' });
    expect(refused.status).toBe(422);
    const page = await refused.text();
    expect(page).toContain('value="Bolt and Nut"');
    expect(page).toContain('value="jan"');
    expect(page).toContain('This is not a mail address');
    expect(page).toContain('Pick one of the choices.');
    expect(page).not.toContain(answers.password);
    expect(await db('people').select()).toEqual([]);
  });

  it('is set up once, by one of many who come at the same moment', async () => {
    const racers = Array.from({ length: 8 }, newVisitor);
    const outcomes = await Promise.all(
      racers.map((racer, n) => racer.postForm(path, { ...answers, email: `jan${n}@bolt.example` })),
    );
    expect(outcomes.map(({ status }) => status).sort()).toEqual([303, ...Array(7).fill(410)]);
    const [shop, ...otherShops] = await db('shops').select('name', 'time_zone', 'language', 'currency');
    expect(shop).toEqual({
      name: 'Bolt and Nut',
      time_zone: 'Europe/Warsaw',
      language: 'pl',
      currency: 'PLN',
    });
    expect(otherShops).toEqual([]);
    expect(await db('people').select('kind', 'name', 'active')).toEqual([
      { kind: 'person', name: 'Jan Nowak', active: 1 },
    ]);
    expect(await db('person_roles').pluck('role')).toEqual(['admin']);
    expect(await db('activity').orderBy('seq').pluck('kind')).toEqual([
      'set-up-link.made',
      'shop.set-up',
      'person.added',
      'session.started',
    ]);

    const winner = racers[outcomes.findIndex(({ status }) => status === 303)];
    const me = await winner?.get('/me');
    expect(me?.status).toBe(200);
    expect(await me?.text()).toContain('Moja strona');
    expect((await newVisitor().get(path)).status).toBe(410);
  });

  it('sends its cookie over https alone', async () => {
    const [admin] = await db('people').pluck('email');
    const answer = await newVisitor().signIn(String(admin), answers.password);
    expect(answer.headers.getSetCookie()[0]).toMatch(/Secure/);
  });
});
