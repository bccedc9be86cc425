import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashPassword } from '../../../src/server/auth/password.ts';
import { hashToken } from '../../../src/server/auth/token.ts';
import { demoSignIns } from '../../../src/server/demo-sign-ins.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { openAppDatabase } from '../../setup/app-database.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';
import { Visitor } from '../../setup/visitor.ts';

const foreign = { email: 'eva@another.example', password: 'another shop across the road' };
let running: RunningApp;
let db: Knex;
const callers = new Map<string, Visitor>();

beforeAll(async () => {
  running = await startApp({ env: { TRUST_PROXY: 'yes' } });
  db = openAppDatabase(running);
  const shop = await buildShop({}, db);
  await buildPerson(shop, ['engineer', 'admin'], {
    email: foreign.email,
    password_hash: await hashPassword(foreign.password),
  });
  callers.set('nobody', new Visitor(running.url));
  const people = [...demoSignIns, { ...foreign, role: 'foreign engineer' }];
  for (const [index, { role, email, password }] of people.entries()) {
    const visitor = new Visitor(running.url, `203.0.113.${index}`);
    await visitor.signIn(email, password);
    callers.set(role, visitor);
  }
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await running.stop();
});

function as(role: string): Visitor {
  const visitor = callers.get(role);
  if (!visitor) throw new RangeError(`as: no caller is called ${role}`);
  return visitor;
}

async function addSession(email: string): Promise<string> {
  const person = await db('people').where({ email }).first('id', 'shop_id');
  const handle = newId();
  await db('sessions').insert({
    id: newId(),
    shop_id: person.shop_id,
    id_hash: hashToken(handle),
    handle,
    person_id: person.id,
    expires_at: Date.now() + 1e6,
    last_seen_at: Date.now(),
    device: '',
    created_at: Date.now(),
  });
  return handle;
}

async function addToken(visitor: Visitor): Promise<{ id: string; token: string }> {
  const answer = await visitor.call('POST', '/api/me/tokens', { name: 'monthly report' });
  expect(answer.status).toBe(201);
  return answer.json();
}

/** Everything of the two shops that a refused call might have changed. */
async function readState(): Promise<string> {
  const tables = ['people', 'sessions', 'api_tokens', 'activity'] as const;
  const rows = await Promise.all(tables.map((table) => db(table).orderBy('id').select()));
  return JSON.stringify(rows).replace(/"last_(seen|used)_at":(\d+|null)/g, '');
}

describe('calls that are refused change nothing', () => {
  const noId = '01900000-0000-7000-8000-000000000000';
  const engineersOnly = { nobody: 401, supervisor: 403, admin: 403 };
  const calls: [string, string, unknown, Record<string, number>][] = [
    ['GET', '/api/me/sessions', undefined, { nobody: 401 }],
    ['DELETE', '/api/me/sessions', undefined, { nobody: 401 }],
    ['DELETE', `/api/me/sessions/${noId}`, undefined, { nobody: 401, supervisor: 404, admin: 404 }],
    ['PATCH', '/api/me', { language: 'pl' }, { nobody: 401 }],
    ['PATCH', '/api/me', { language: 'tlh' }, { supervisor: 422, engineer: 422, admin: 422 }],
    ['PATCH', '/api/me', { role: 'admin' }, { supervisor: 422, engineer: 422, admin: 422 }],
    ['GET', '/api/me/tokens', undefined, engineersOnly],
    ['POST', '/api/me/tokens', { name: 'x' }, engineersOnly],
    ['POST', '/api/me/tokens', { name: ' ' }, { engineer: 422 }],
    ['DELETE', `/api/me/tokens/${noId}`, undefined, { ...engineersOnly, engineer: 404 }],
  ];
  const table = calls.flatMap(([method, path, body, statuses]) =>
    Object.entries(statuses).map(([role, status]) => ({ method, path, body, role, status })),
  );

  it.each(table)('$method $path as $role: $status', async ({ method, path, body, role, status }) => {
    const before = await readState();
    expect((await as(role).call(method, path, body)).status).toBe(status);
    expect(await readState()).toBe(before);
  });

  it('DELETE of a session or token of a colleague, or of another shop: 404', async () => {
    const sessions = [await addSession('dana@harrowlane.example'), await addSession(foreign.email)];
    const tokens = [await addToken(as('foreign engineer'))];
    const before = await readState();
    for (const handle of sessions) {
      expect((await as('engineer').call('DELETE', `/api/me/sessions/${handle}`)).status).toBe(404);
    }
    for (const { id } of tokens) {
      expect((await as('engineer').call('DELETE', `/api/me/tokens/${id}`)).status).toBe(404);
    }
    expect(await readState()).toBe(before);
  });

  it.each(['/me', '/sign-out'])('the page %s as nobody leads elsewhere', async (path) => {
    expect((await as('nobody').get(path)).status).toBe(303);
  });

  it('the forms of My page as nobody, or for a role that may not', async () => {
    const before = await readState();
    expect((await as('nobody').postForm('/me', { do: 'end-all' })).status).toBe(401);
    expect((await as('supervisor').postForm('/me', { do: 'add-token', name: 'x' })).status).toBe(403);
    expect(await readState()).toBe(before);
  });
});

describe('what is one’s own', () => {
  it('sessions are listed without their ids, and ended by their handles', async () => {
    const handle = await addSession('sam@harrowlane.example');
    const answer = await as('engineer').call('GET', '/api/me/sessions');
    const { sessions } = (await answer.json()) as { sessions: Record<string, unknown>[] };
    expect(sessions).toHaveLength(2);
    expect(sessions.filter(({ isThisOne }) => isThisOne)).toHaveLength(1);
    for (const session of sessions) {
      expect(Object.keys(session).sort()).toEqual(
        ['createdAt', 'device', 'expiresAt', 'handle', 'isThisOne', 'lastSeenAt'].sort(),
      );
    }
    expect((await as('engineer').call('DELETE', `/api/me/sessions/${handle}`)).status).toBe(204);
    expect(await db('sessions').where({ handle })).toEqual([]);
  });

  it('language and theme are kept', async () => {
    const answer = await as('admin').call('PATCH', '/api/me', { language: 'vi', theme: 'dark' });
    expect(await answer.json()).toEqual({ name: 'Robin Vale', language: 'vi', theme: 'dark' });
    const page = await (await as('admin').get('/me')).text();
    expect(page).toContain('lang="vi"');
    expect(page).toContain('data-theme="dark"');
  });

  it('a new password needs the present one, and ends the other sessions', async () => {
    const [supervisor] = demoSignIns;
    const other = new Visitor(running.url, '203.0.113.200');
    await other.signIn(supervisor.email, supervisor.password);
    const change = { do: 'password', current: 'not this one', password: 'the lids stay on from friday' };
    const refused = await as('supervisor').postForm('/me', change);
    expect(refused.status).toBe(422);
    expect(await refused.text()).toContain('This is not your present password.');
    const answer = await as('supervisor').postForm('/me', { ...change, current: supervisor.password });
    expect(answer.headers.get('location')).toBe('/me?done=password');
    expect((await as('supervisor').get('/me')).status).toBe(200);
    expect((await other.get('/me')).status).toBe(303);
  });
});

describe('a token', () => {
  const bearer = (token: string) => ({ Authorization: `Bearer ${token}`, Cookie: '' });

  it('is shown once on My page, in no address, and kept as a hash', async () => {
    const engineer = as('engineer');
    const posted = await engineer.postForm('/me', { do: 'add-token', name: 'audit robot' });
    expect([posted.status, posted.headers.get('location')]).toEqual([303, '/me']);
    const [token = ''] = /trywell_[\w-]{22}/.exec(await (await engineer.get('/me')).text()) ?? [];
    expect(token).not.toBe('');
    expect(await (await engineer.get('/me')).text()).not.toContain(token);
    expect(JSON.stringify(await db('api_tokens').select())).not.toContain(token);
    expect(JSON.stringify(await db('activity').select())).not.toContain(token);
    expect(running.app.errors()).not.toContain(token);
  });

  it('that is unknown, ended, expired, or whose person lost the role, opens nothing', async () => {
    const { id, token } = await addToken(as('engineer'));
    const nobody = new Visitor(running.url, '203.0.113.201');
    const path = '/api/me/sessions';
    // Live, it is known, but one's own sessions are no business of programs.
    expect((await nobody.get(path, bearer(token))).status).toBe(403);
    expect((await nobody.get(path, bearer('trywell_AAAAAAAAAAAAAAAAAAAAAA'))).status).toBe(401);
    const dead = [{ revoked_at: 1 }, { expires_at: 1 }];
    for (const change of dead) {
      const { revoked_at, expires_at } = await db('api_tokens').where({ id }).first();
      await db('api_tokens').where({ id }).update(change);
      expect((await nobody.get(path, bearer(token))).status).toBe(401);
      await db('api_tokens').where({ id }).update({ revoked_at, expires_at });
    }
    const person = await db('people').where({ email: 'sam@harrowlane.example' }).first('id');
    await db('person_roles').where({ person_id: person.id }).update({ role: 'supervisor' });
    expect((await nobody.get(path, bearer(token))).status).toBe(401);
    await db('person_roles').where({ person_id: person.id }).update({ role: 'engineer' });
  });

  it('changes nothing, and does not lend its person to pages', async () => {
    const { token } = await addToken(as('engineer'));
    const nobody = new Visitor(running.url, '203.0.113.202');
    const before = await readState();
    const answer = await fetch(new URL('/api/me', running.url), {
      method: 'PATCH',
      headers: { ...bearer(token), Origin: running.url, 'Content-Type': 'application/json' },
      body: JSON.stringify({ language: 'es' }),
    });
    expect(answer.status).toBe(403);
    expect((await nobody.get('/me', bearer(token))).status).toBe(303);
    expect(await readState()).toBe(before);
  });

  it('is good for 120 calls a minute', async () => {
    const { token } = await addToken(as('engineer'));
    const nobody = new Visitor(running.url, '203.0.113.203');
    for (let call = 0; call < 120; call += 1) await nobody.get('/api/me/sessions', bearer(token));
    const refused = await nobody.get('/api/me/sessions', bearer(token));
    expect(refused.status).toBe(429);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
  });
});
