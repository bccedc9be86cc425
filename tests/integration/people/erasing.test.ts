import { describe, expect, it } from 'vitest';
import { isPhoneSuppressed } from '../../../src/features/message/addressee.repository.ts';
import { queueMessage } from '../../../src/features/message/message.service.ts';
import { withdrawConsent } from '../../../src/features/message/withdrawal.service.ts';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { findPerson } from '../../../src/features/people/person.repository.ts';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { personalTables } from '../../../src/features/people/person-export.repository.ts';
import { exportPerson } from '../../../src/features/people/person-export.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildRun } from '../../builders/trial.ts';
import { admin, buildShopWithAdmin, describeAna, newAddress, refusalOf } from './people-fixture.ts';

async function answerRun(scope: ShopScope, personId: string): Promise<void> {
  const run = await buildRun(scope, { personId, state: 'done' });
  const textId = newId();
  await scope.db('inbox_texts').insert({
    id: textId,
    shop_id: scope.shopId,
    provider_id: newId(),
    person_id: personId,
    body: 'run 1 41.5 Ana here',
    sent_at: 1,
    received_at: 1,
    state: 'read',
  });
  await scope.db('readings').insert({
    id: newId(),
    shop_id: scope.shopId,
    run_id: run.id,
    result: 0,
    part: 0,
    value: 41.5,
    state: 'counts',
    source: 'text',
    inbox_text_id: textId,
    entered_by: personId,
    submission: newId(),
    created_at: 1,
  });
}

describe('erasing a person', () => {
  it('leaves nothing that tells who it was, and keeps the readings', async () => {
    const { scope } = await buildShopWithAdmin();
    const email = newAddress('ana');
    const { id } = await addPerson(scope, describeAna({ email, invite: true }), admin);
    await answerRun(scope, id);
    const before = await findPerson(scope, id);
    const erased = await erasePerson(scope, { id, revision: before?.revision ?? 0 }, admin);
    const gone = { email: null, phone: null, active: false, joined: false, roles: [], consent: 'unasked' };
    expect(erased).toMatchObject({ name: 'former operator 1', ...gone });

    const tables = ['people', 'messages', 'inbox_texts', 'links', 'sessions', 'activity', 'conversations'];
    for (const table of tables) {
      const rows = JSON.stringify(await scope.db(table).where({ shop_id: scope.shopId }));
      for (const trace of ['Ana', '5550142', email])
        expect(rows, `${trace} in ${table}`).not.toContain(trace);
    }
    expect(await scope.db('readings').where({ entered_by: id })).toMatchObject([{ value: 41.5 }]);
    const again = erasePerson(scope, { id, revision: erased.revision }, admin);
    expect((await refusalOf(again)).code).toBe('changed-meanwhile');
  });

  it('numbers the former people of a shop one after the other', async () => {
    const { scope } = await buildShopWithAdmin();
    const names: string[] = [];
    for (const [phone, role] of [
      ['+12025550142', 'operator'],
      ['+12025550143', 'engineer'],
      ['+12025550144', 'operator'],
    ]) {
      const fields = { phone, roles: [role], email: newAddress('p') };
      const { id, revision } = await addPerson(scope, describeAna(fields), admin);
      names.push((await erasePerson(scope, { id, revision }, admin)).name);
    }
    expect(names).toEqual(['former operator 1', 'former colleague 2', 'former operator 3']);
  });

  it('who had opted out lets no text go to that number again, and does not keep it readable', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id } = await addPerson(scope, describeAna({ invite: true }), admin);
    await inTransaction(scope, (inner) =>
      withdrawConsent(inner, { personId: id, phone: '+12025550142', how: 'text' }),
    );
    const left = await findPerson(scope, id);
    await erasePerson(scope, { id, revision: left?.revision ?? 0 }, admin);
    expect(await isPhoneSuppressed(scope, '+12025550142')).toBe(true);
    const queued = await inTransaction(scope, (inner) =>
      queueMessage(inner, { template: 'practice', params: {}, personId: id, dedupe: newId() }),
    );
    expect(queued).toEqual({ queued: false, reason: 'no-address' });
    const rows = JSON.stringify(await scope.db('suppressed_phones').where({ shop_id: scope.shopId }));
    expect(rows).not.toContain('5550142');
  });
});

describe('handing over what is held about a person', () => {
  it('gives everything that points at them, and no hash', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id } = await addPerson(scope, describeAna({ invite: true }), admin);
    await answerRun(scope, id);
    const held = JSON.stringify(await exportPerson(scope, id, admin));
    for (const trace of ['Ana Ruiz', '+12025550142', 'run 1 41.5 Ana here', '41.5', 'consent.asked']) {
      expect(held).toContain(trace);
    }
    expect(held).not.toMatch(/hash/);
  });

  it('leaves out no table of the schema that points at people', async () => {
    const tables: { name: string }[] = await database().raw(
      "select name from sqlite_master where type = 'table' and name not like 'sqlite_%'",
    );
    const pointers: string[] = [];
    for (const { name } of tables) {
      const keys: { table: string; from: string }[] = await database().raw(
        `pragma foreign_key_list('${name}')`,
      );
      for (const key of keys) {
        if (key.table === 'people' && key.from !== 'shop_id') pointers.push(`${name}.${key.from}`);
      }
    }
    const known = personalTables.map(({ table, column }) => `${table}.${column}`);
    expect(pointers.sort()).toEqual([...known].sort());
  });
});
