import { describe, expect, it } from 'vitest';
import { withdrawConsent } from '../../../src/features/message/withdrawal.service.ts';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { invitePerson } from '../../../src/features/people/invite-person.service.ts';
import { findPerson } from '../../../src/features/people/person.repository.ts';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';
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

describe('adding a person', () => {
  it('keeps the number in E.164 form and says so in the log without name or number', async () => {
    const { scope } = await buildShopWithAdmin();
    const person = await addPerson(scope, describeAna({ phone: '(202) 555-0142' }), admin);
    expect(person).toMatchObject({
      phone: '+12025550142',
      consent: 'unasked',
      roles: ['operator'],
      active: true,
    });
    const [line] = await listActivity(scope, { limit: 1, subjectId: person.id });
    expect(line).toMatchObject({ kind: 'person.added', actor_id: scope.actor.id });
    expect(line?.details).not.toMatch(/Ana|555/);
  });

  it('with the same id twice adds one person and asks once', async () => {
    const { scope } = await buildShopWithAdmin();
    const wish = describeAna({ id: newId(), invite: true });
    const first = await addPerson(scope, wish, admin);
    expect(await addPerson(scope, wish, admin)).toEqual(first);
    expect(await waitingMessages(scope, first.id)).toEqual(['consent']);
  });

  it('with the id of somebody in another shop finds nobody', async () => {
    const [one, two] = [await buildShopWithAdmin(), await buildShopWithAdmin()];
    const { id } = await addPerson(one.scope, describeAna(), admin);
    expect((await refusalOf(addPerson(two.scope, describeAna({ id }), admin))).code).toBe('not-found');
    expect(await two.scope.db('people').where({ shop_id: two.scope.shopId })).toHaveLength(1);
  });

  it.each([
    ['phone', { phone: '+4812' }, 'not-a-phone'],
    ['phone', { phone: '+1 202 555 0155' }, 'taken'],
    ['email', { roles: ['engineer'], email: 'SAM@elsewhere.example', phone: null }, 'taken'],
  ])('names %s where it does not fit: %j', async (field, fields, code) => {
    const { scope } = await buildShopWithAdmin();
    await buildPerson(scope, ['operator'], { phone: '+12025550155' });
    const other = await buildShop();
    await scope.db('people').where({ email: 'sam@elsewhere.example' }).update({ email: null });
    await buildPerson(other, ['engineer'], { email: 'sam@elsewhere.example' });
    const error = await refusalOf(addPerson(scope, describeAna(fields), admin));
    expect(error.fields).toEqual([{ pointer: `#/${field}`, code }]);
  });

  it('by a supervisor is for operators alone', async () => {
    const { scope } = await buildShopWithAdmin();
    for (const fields of [
      { roles: ['operator', 'admin'], email: 'a@b.example' },
      { roles: ['supervisor'], email: 'a@b.example' },
      { safetyPerson: true },
    ]) {
      const error = await refusalOf(addPerson(scope, describeAna(fields), supervisor));
      expect(error.code).toBe('forbidden');
    }
    expect(await addPerson(scope, describeAna(), supervisor)).toMatchObject({ roles: ['operator'] });
  });

  it('whose number opted out before asks nobody', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id } = await addPerson(scope, describeAna(), admin);
    await inTransaction(scope, (inner) =>
      withdrawConsent(inner, { personId: id, phone: '+12025550142', how: 'text' }),
    );
    const left = await findPerson(scope, id);
    await erasePerson(scope, { id, revision: left?.revision ?? 0 }, admin);
    const again = await addPerson(scope, describeAna({ invite: true }), admin);
    expect(again.consent).toBe('opted out');
    expect(await waitingMessages(scope, again.id)).toEqual([]);
    expect((await refusalOf(invitePerson(scope, again.id, admin))).code).toBe('not-now');
  });
});

describe('an invitation', () => {
  it('goes by mail with a link and by text with the question, each recorded', async () => {
    const { scope } = await buildShopWithAdmin();
    const fields = { roles: ['supervisor', 'operator'], email: newAddress('dana'), invite: true };
    const person = await addPerson(scope, describeAna(fields), admin);
    expect(await waitingMessages(scope, person.id)).toEqual(['consent', 'invitation']);
    expect(person.consent).toBe('asked');
    expect(await scope.db('links').where({ person_id: person.id, purpose: 'invite' })).toHaveLength(1);
    expect(await kindsAbout(scope, person.id)).toEqual(['person.invited', 'consent.asked', 'person.added']);
  });

  it('sent anew ends the link of the one before, and five an hour are enough', async () => {
    const { scope } = await buildShopWithAdmin();
    const fields = { roles: ['engineer'], email: newAddress('lee'), phone: null };
    const { id } = await addPerson(scope, describeAna(fields), admin);
    for (let round = 0; round < 5; round += 1) await invitePerson(scope, id, admin);
    expect(await scope.db('links').where({ person_id: id }).whereNull('revoked_at')).toHaveLength(1);
    const error = await refusalOf(invitePerson(scope, id, admin));
    expect(error.code).toBe('too-many');
    expect(error.retryAfterSeconds).toBeGreaterThan(0);
  });
});
