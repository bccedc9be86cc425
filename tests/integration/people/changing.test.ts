import { describe, expect, it } from 'vitest';
import { findAddressee, isPhoneSuppressed } from '../../../src/features/message/addressee.repository.ts';
import { acceptConsent } from '../../../src/features/message/consent.service.ts';
import { withdrawConsent } from '../../../src/features/message/withdrawal.service.ts';
import { changePerson } from '../../../src/features/people/change-person.service.ts';
import { findPerson } from '../../../src/features/people/person.repository.ts';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson } from '../../builders/shop.ts';
import {
  admin,
  buildShopWithAdmin,
  describeAna,
  kindsAbout,
  newAddress,
  refusalOf,
  supervisor,
  waitingMessages,
} from './people-fixture.ts';

describe('changing a person', () => {
  it('tells whoever was slower how things stand now', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id, revision } = await addPerson(scope, describeAna(), admin);
    await changePerson(scope, { id, input: { revision, name: 'Ana Ruiz Gil' } }, admin);
    const error = await refusalOf(changePerson(scope, { id, input: { revision, language: 'en' } }, admin));
    expect(error.code).toBe('changed-meanwhile');
    expect(error.present).toMatchObject({ person: { name: 'Ana Ruiz Gil', revision: revision + 1 } });
    expect((await findPerson(scope, id))?.language).toBe('es');
  });

  it('shows a supervisor no number in what has changed', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id, revision } = await addPerson(scope, describeAna(), admin);
    await changePerson(scope, { id, input: { revision, name: 'A' } }, admin);
    const error = await refusalOf(changePerson(scope, { id, input: { revision, name: 'B' } }, supervisor));
    expect(error.code).toBe('changed-meanwhile');
    expect(JSON.stringify(error.present)).not.toContain('2025550142');
  });

  it('of the number ends consent, drops what waits and shuts the links that went to it', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id } = await addPerson(scope, describeAna({ invite: true }), admin);
    await inTransaction(scope, async (inner) => {
      const addressee = await findAddressee(inner, id);
      if (addressee) await acceptConsent(inner, addressee, newId());
    });
    const before = await findPerson(scope, id);
    expect(before?.consent).toBe('agreed');
    const change = { revision: before?.revision ?? 0, phone: '+12025550177' };
    const after = await changePerson(scope, { id, input: change }, admin);
    expect(after).toMatchObject({ consent: 'unasked', consentAt: null, phone: '+12025550177' });
    expect(await waitingMessages(scope, id)).toEqual([]);
    expect(await kindsAbout(scope, id)).toContain('consent.reset');
  });

  it('to a number that opted out leaves nothing to ask', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id } = await addPerson(scope, describeAna(), admin);
    await inTransaction(scope, (inner) =>
      withdrawConsent(inner, { personId: id, phone: '+12025550142', how: 'text' }),
    );
    const left = await findPerson(scope, id);
    await changePerson(scope, { id, input: { revision: left?.revision ?? 0, phone: null } }, admin);
    expect(await isPhoneSuppressed(scope, '+12025550142')).toBe(true);
    const second = await addPerson(scope, describeAna({ name: 'Minh', phone: '+12025550199' }), admin);
    const change = { revision: second.revision, phone: '+12025550142' };
    const moved = await changePerson(scope, { id: second.id, input: change }, admin);
    expect(moved.consent).toBe('opted out');
  });

  it('of the mail address tells the old one and shuts the links mailed to it', async () => {
    const { scope } = await buildShopWithAdmin();
    const email = newAddress('old');
    const fields = { roles: ['engineer'], email, phone: null, invite: true };
    const { id, revision } = await addPerson(scope, describeAna(fields), admin);
    await changePerson(scope, { id, input: { revision, email: newAddress('new') } }, admin);
    const mails = await scope.db('messages').where({ template: 'emailChanged', shop_id: scope.shopId });
    expect(mails.map((mail) => mail.recipient)).toEqual([email]);
    expect(await scope.db('links').where({ person_id: id }).whereNull('revoked_at')).toEqual([]);
  });

  it('of roles ends the sessions and keeps before and after in the log', async () => {
    const { scope } = await buildShopWithAdmin();
    const id = await buildPerson(scope, ['supervisor']);
    await scope.db('sessions').insert({
      id: newId(),
      shop_id: scope.shopId,
      id_hash: newId(),
      handle: newId(),
      person_id: id,
      expires_at: Number.MAX_SAFE_INTEGER,
      last_seen_at: 0,
      device: '',
      created_at: 0,
    });
    await changePerson(scope, { id, input: { revision: 1, roles: ['engineer', 'supervisor'] } }, admin);
    expect(await scope.db('sessions').where({ person_id: id })).toEqual([]);
    const lines = await listActivity(scope, { limit: 9, subjectId: id });
    const line = lines.find(({ kind }) => kind === 'person.roles-changed');
    const roles = { before: ['supervisor'], after: ['engineer', 'supervisor'] };
    expect(JSON.parse(line?.details ?? '{}')).toEqual({ v: 1, ...roles });
  });

  it('by a supervisor makes no one more than an operator and touches no one who is more', async () => {
    const { scope, adminId } = await buildShopWithAdmin();
    const { id, revision } = await addPerson(scope, describeAna(), admin);
    const wishes = [{ roles: ['admin' as const], email: 'x@y.example' }, { safetyPerson: true }];
    for (const wish of wishes) {
      const input = { revision, ...wish };
      expect((await refusalOf(changePerson(scope, { id, input }, supervisor))).code).toBe('forbidden');
    }
    const input = { revision: 1, name: 'X' };
    expect((await refusalOf(changePerson(scope, { id: adminId, input }, supervisor))).code).toBe('forbidden');
  });
});
