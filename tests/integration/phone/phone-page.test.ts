import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import type { Knex } from 'knex';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createLink } from '../../../src/server/auth/links.ts';
import { openDatabase } from '../../../src/server/db/connection.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildRunningTrial } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
import { type RunningApp, startApp } from '../../setup/running-app.ts';

/** All that a phone must fetch before it can read a run: page and styles, compressed. */
const budgetBytes = 14 * 1024;

let app: RunningApp;
let db: Knex;
let scope: ShopScope;
let page: string;
let runId: string;

beforeAll(async () => {
  app = await startApp();
  db = openDatabase({ kind: 'sqlite', file: join(app.dataDir, 'trywell.sqlite') });
  scope = await buildShop({ text_number: '+12025557777' }, db);
  const ownerId = await buildPerson(scope, ['supervisor']);
  const ana = await buildPerson(scope, ['operator'], { name: 'Ana', phone: '+12025557778', language: 'vi' });
  const trialId = await buildRunningTrial(scope, { ownerId });
  const run = await db('runs').where({ trial_id: trialId, number: 1 }).first('id');
  runId = run.id;
  await db('runs').where({ id: runId }).update({ state: 'asked', person_id: ana, asked_at: 1 });
  const { token } = await createLink(scope, {
    ...{ purpose: 'operator', personId: ana, trialId, lifetime: 3_600_000 },
  });
  page = `/t/${token}`;
}, 60_000);
afterAll(async () => {
  await db.destroy();
  await app.stop();
});

const get = (path: string) => fetch(app.url + path);

describe('the phone page as it is served', () => {
  it('weighs at most 14 KB with its styles, and its one script is small and never needed', async () => {
    const html = await (await get(page)).text();
    const sheets = [...html.matchAll(/<link rel="stylesheet" href="([^"]+)"/g)].map(([, href]) => href ?? '');
    const css = await Promise.all(sheets.map(async (href) => (await get(href)).text()));
    const weight = [html, ...css].reduce((sum, text) => sum + gzipSync(text).length, 0);
    expect(weight).toBeLessThanOrEqual(budgetBytes);
    const scripts = [...html.matchAll(/<script[^>]*>/g)].map(([tag]) => tag);
    expect(scripts).toEqual(['<script type="module" src="/phone.js">']);
    expect(gzipSync(await (await get('/phone.js')).text()).length).toBeLessThan(2_000);
    expect(html).not.toMatch(/@font-face|<img/);
    expect(html).toContain('sms:+12025557777?body=1%3A%20');
  });

  it('changes nothing by being looked at', async () => {
    const before = await db('runs').where({ id: runId }).first();
    await get(page);
    await get(`${page}/runs/${runId}`);
    expect(await db('runs').where({ id: runId }).first()).toEqual(before);
  });

  it('takes a picture by a plain form', async () => {
    const image = sharp({ create: { width: 30, height: 20, channels: 3, background: '#204060' } });
    const form = new FormData();
    form.set('photo', new Blob([new Uint8Array(await image.jpeg().toBuffer())]), 'photo.jpg');
    const send = (origin: string) =>
      fetch(`${app.url}${page}/runs/${runId}`, {
        ...{ method: 'POST', body: form, redirect: 'manual', headers: { origin } },
      });
    expect((await send('https://elsewhere.example')).status).toBe(403);
    const answer = await send(app.url);
    expect([answer.status, answer.headers.get('location')]).toEqual([303, `${page}?done=photo`]);
    const photos = await db('photos').where({ run_id: runId });
    expect(photos).toMatchObject([{ width: 30, height: 20, source: 'phone page' }]);
  });

  it('is refused a body that is too large before it is read', async () => {
    const answer = await fetch(`${app.url}${page}/runs/${runId}`, {
      method: 'POST',
      body: Buffer.alloc(11 * 1024 * 1024),
      headers: { origin: app.url, 'content-type': 'multipart/form-data; boundary=x' },
    }).catch(() => null);
    // The line may be cut while the rest is still being sent.
    if (answer !== null) expect(answer.status).toBe(413);
    expect(await db('photos').where({ run_id: runId })).toHaveLength(1);
  });
});
