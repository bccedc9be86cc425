import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { permissions, type Role, roles, rolesMay } from '../../../src/server/auth/permissions.ts';
import type { Viewer } from '../../../src/server/auth/viewer.ts';
import { database } from '../../../src/server/db/connection.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import type { Access } from '../../../src/server/http/define-endpoint.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { buildRun } from '../../builders/trial.ts';
import { type Attempt, attempt, endpoints } from './endpoints.ts';
import { buildReviewedTrial } from './trial-of-shop.ts';

const json = (value: unknown) => ({ type: 'application/json', text: JSON.stringify(value) });

/** A body that each endpoint would take, so that nothing but the permission or the foreign id can be why it says no. */
const bodies: Record<string, Attempt['body']> = {
  'PATCH /api/people/[id]': json({ revision: 1, name: 'Changed by a stranger' }),
  'POST /api/people/[id]/deactivate': json({ revision: 1 }),
  'POST /api/people/[id]/activate': json({ revision: 1 }),
  'POST /api/people/[id]/erase': json({ revision: 1 }),
  'POST /api/people/[id]/invite': json({}),
  'PUT /api/trials/[id]': json({}),
  'PATCH /api/trials/[id]': json({ revision: 1, putAway: true }),
  'PATCH /api/trials/[id]/answers': json({
    question: 'worth',
    base: 0,
    content: { change: '3' },
    save: '6f1d2c3b-8a4e-4d5f-9b60-7c8d9e0f1a2b',
  }),
  'PUT /api/trials/[id]/models/[model]': json({
    name: 'A stranger’s model',
    spec: {
      ...{ result: 0, terms: ['A'], refuseHierarchy: false, transform: { kind: 'none' }, without: [] },
      ...{ stretchesAsBlocks: false, error: 'ladder' },
    },
  }),
  'POST /api/trials/[id]/plan': json({ revision: 1, proposalId: 'any' }),
  'POST /api/trials/[id]/practice': json({}),
  'POST /api/trials/[id]/events': json({ event: 'start', revision: 1 }),
  'POST /api/trials/[id]/share': json({}),
  'POST /api/trials/[id]/check-back': json({ holds: true }),
  'POST /api/trials/[id]/next': json({ id: newId(), reason: 'untie' }),
  'POST /api/trials/[id]/readings/import': { type: 'text/csv', text: 'run,x\n1,2' },
  'POST /api/trials/[id]/phone': json({ personId: newId() }),
  'POST /api/runs/[id]/events': json({ event: 'skip', revision: 1, submission: newId() }),
  'POST /api/reviews/[id]/approve': json({ round: 1 }),
  'POST /api/reviews/[id]/send-back': json({ round: 1 }),
  'POST /api/reviews/[id]/take-back': json({ round: 1 }),
  'POST /api/reviews/[id]/comments': json({ id: newId(), place: '#/worth', words: 'From a stranger' }),
  'PATCH /api/reviews/[id]/comments': json({ id: newId(), settled: true }),
};

/** What an endpoint that reads no body wants to know from the address. */
const queries: Record<string, string> = { 'DELETE /api/trials/[id]': 'revision=1' };

const needsPerson = (access: Access) => access !== 'public' && access !== 'signed';

let here: ShopScope;
let params: Record<string, string>;
const viewers = new Map<Role, Viewer>();
let stranger: Viewer;

async function buildViewer(scope: ShopScope, held: Role[]): Promise<Viewer> {
  const personId = await buildPerson(scope, held, { password_hash: 'x' });
  return {
    personId,
    shopId: scope.shopId,
    shopName: 'Shop',
    timeZone: 'UTC',
    name: 'Somebody',
    language: 'en',
    theme: 'auto',
    roles: held,
    sessionHandle: newId(),
  };
}

/** A fingerprint of everything that is stored, save how often somebody tried. */
async function readAll(): Promise<string> {
  const tables: { name: string }[] = await database().raw(
    "select name from sqlite_master where type = 'table' and name not like 'sqlite_%' order by name",
  );
  const rows = [];
  for (const { name } of tables) if (name !== 'rate_limits') rows.push([name, await database()(name)]);
  return createHash('sha256').update(JSON.stringify(rows)).digest('hex');
}

beforeAll(async () => {
  here = await buildShop();
  for (const role of roles) viewers.set(role, await buildViewer(here, [role]));
  stranger = await buildViewer(await buildShop(), [...roles]);
  const operator = viewers.get('operator')?.personId ?? '';
  const [handle, tokenId] = [newId(), newId()];
  await here.db('sessions').insert({
    id: newId(),
    shop_id: here.shopId,
    id_hash: newId(),
    handle,
    person_id: operator,
    expires_at: Number.MAX_SAFE_INTEGER,
    last_seen_at: 0,
    device: '',
    created_at: 0,
  });
  await here.db('api_tokens').insert({
    id: tokenId,
    shop_id: here.shopId,
    token_hash: newId(),
    prefix: 'trywell_ab',
    name: 'Token',
    person_id: operator,
    expires_at: Number.MAX_SAFE_INTEGER,
    created_at: 0,
  });
  const supervisor = viewers.get('supervisor')?.personId ?? '';
  const { trialId, reviewId } = await buildReviewedTrial(here, supervisor);
  const run = await buildRun(here, { personId: operator, state: 'waiting' });
  const photo = newId();
  await here.db('photos').insert({
    ...{ id: photo, shop_id: here.shopId, run_id: run.id, sha256: 'a', width: 1, height: 1 },
    ...{ bytes: Buffer.from('a'), source: 'text', created_at: 0 },
  });
  params = {
    ...{ handle, id: operator, token: tokenId, trial: trialId, review: reviewId, run: run.id, photo },
  };
});

function paramsFor(path: string): Record<string, string> {
  const [, kind] = /^\/api\/(me\/tokens|trials|reviews|runs|photos)\b/.exec(path) ?? [];
  const name =
    {
      ...{ 'me/tokens': 'token', trials: 'trial', reviews: 'review', runs: 'run', photos: 'photo' },
    }[kind ?? ''] ?? 'id';
  return { id: params[name] ?? '', handle: params['handle'] ?? '', model: newId() };
}

const table = endpoints.map((endpoint) => ({ ...endpoint, name: `${endpoint.method} ${endpoint.path}` }));

describe('every endpoint', () => {
  it('is here: there is something to try', () => {
    expect(table.length).toBeGreaterThan(20);
  });

  it.each(table)('$name says who may call it', ({ access }) => {
    const known: (Access | undefined)[] = [...permissions, 'signed-in', 'public', 'signed'];
    expect(known.filter((each) => each !== undefined)).toContain(access);
  });
});

describe.each(table.filter(({ access }) => access && needsPerson(access)))('$name', (endpoint) => {
  const { access, name, path } = endpoint;
  const body = bodies[name] ?? json({});

  it('knows nobody who is not signed in, and changes nothing', async () => {
    const before = await readAll();
    const answer = await attempt(endpoint, { viewer: null, params: paramsFor(path), body });
    expect(answer.status).toBe(401);
    expect(await readAll()).toBe(before);
  });

  it.each(roles)('opens to a %s as the table of permissions says', async (role) => {
    const viewer = viewers.get(role);
    if (!viewer || !access || access === 'public' || access === 'signed') throw new Error('no viewer');
    // An id that is nobody's: who may call gets as far as that.
    const nowhere = { id: newId(), handle: newId() };
    const before = await readAll();
    const unread = { type: 'application/json', text: '{"no such field":true}' };
    const answer = await attempt(endpoint, { viewer, params: nowhere, body: bodies[name] ?? unread });
    const may = access === 'signed-in' || rolesMay([role], access);
    expect(answer.status === 403).toBe(!may);
    expect(answer.status).not.toBe(401);
    expect(answer.status).toBeLessThan(500);
    if (!answer.ok) expect(await readAll()).toBe(before);
  });
});

describe.each(table.filter(({ access, path }) => access && needsPerson(access) && path.includes('[')))(
  '$name of another shop',
  (endpoint) => {
    it('is not found by that shop’s admin, and nothing changes', async () => {
      const { name, path, method } = endpoint;
      const needsBody = !['GET', 'DELETE'].includes(method);
      if (needsBody) expect(Object.keys(bodies)).toContain(name);
      const before = await readAll();
      const answer = await attempt(endpoint, {
        viewer: stranger,
        params: paramsFor(path),
        body: bodies[name],
        query: queries[name],
      });
      expect(answer.status).toBe(404);
      expect(await readAll()).toBe(before);
    });
  },
);

describe.each(table.filter(({ access }) => access === 'signed'))('$name', (endpoint) => {
  it('refuses a call without the service’s signature', async () => {
    const before = await readAll();
    const body = {
      type: 'application/x-www-form-urlencoded',
      text: 'From=%2B1&To=%2B2&Body=hi&MessageSid=SM1',
    };
    const answer = await attempt(endpoint, { viewer: null, body });
    expect(answer.status).toBe(403);
    expect(await readAll()).toBe(before);
  });
});
