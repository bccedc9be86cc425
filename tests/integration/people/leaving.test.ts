import { describe, expect, it } from 'vitest';
import { changePerson } from '../../../src/features/people/change-person.service.ts';
import { erasePerson } from '../../../src/features/people/erase.service.ts';
import { findPerson } from '../../../src/features/people/person.repository.ts';
import { activatePerson, addPerson, deactivatePerson } from '../../../src/features/people/person.service.ts';
import { buildPerson } from '../../builders/shop.ts';
import { buildRun } from '../../builders/trial.ts';
import { admin, buildShopWithAdmin, describeAna, newAddress, refusalOf } from './people-fixture.ts';

describe('leaving', () => {
  it('waits for open runs to be handed over, and names them', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id, revision } = await addPerson(scope, describeAna(), admin);
    const run = await buildRun(scope, { personId: id, state: 'asked' });
    for (const leave of [deactivatePerson, erasePerson]) {
      const error = await refusalOf(leave(scope, { id, revision }, admin));
      expect(error.code).toBe('open-runs');
      expect(error.present).toMatchObject({ openRuns: [{ runId: run.id, number: 1 }] });
    }
    await scope.db('runs').where({ id: run.id }).update({ state: 'done' });
    expect(await deactivatePerson(scope, { id, revision }, admin)).toMatchObject({ active: false });
  });

  it('shuts every door, and can be taken back', async () => {
    const { scope } = await buildShopWithAdmin();
    const fields = { roles: ['engineer'], email: newAddress('sam'), invite: true };
    const { id, revision } = await addPerson(scope, describeAna(fields), admin);
    const off = await deactivatePerson(scope, { id, revision }, admin);
    expect(await scope.db('links').where({ person_id: id }).whereNull('revoked_at')).toEqual([]);
    const which = { id, revision: off.revision };
    expect(await activatePerson(scope, which, admin)).toMatchObject({ active: true });
    expect((await refusalOf(activatePerson(scope, which, admin))).code).toBe('changed-meanwhile');
  });

  it('is refused to the last admin who can sign in, by whatever way', async () => {
    const { scope, adminId } = await buildShopWithAdmin();
    await buildPerson(scope, ['admin'], { name: 'has not joined' });
    await buildPerson(scope, ['admin'], { name: 'has left', password_hash: 'x', active: false });
    await buildPerson(scope, ['supervisor'], { name: 'is no admin', password_hash: 'x' });
    const elsewhere = await buildShopWithAdmin();
    const which = { id: adminId, revision: 1 };
    const input = { revision: 1, roles: ['engineer' as const] };
    const ways = [
      deactivatePerson(scope, which, admin),
      erasePerson(scope, which, admin),
      changePerson(scope, { id: adminId, input }, admin),
    ];
    for (const way of ways) expect((await refusalOf(way)).code).toBe('last-admin');
    expect(await findPerson(scope, adminId)).toMatchObject({ active: true, roles: ['admin'], revision: 1 });
    expect(elsewhere.adminId).not.toBe(adminId);
  });

  it('of two admins at the same moment lets one go', async () => {
    const { scope, adminId } = await buildShopWithAdmin();
    const second = await buildPerson(scope, ['admin'], { password_hash: 'x' });
    const outcomes = await Promise.allSettled([
      deactivatePerson(scope, { id: adminId, revision: 1 }, admin),
      changePerson(scope, { id: second, input: { revision: 1, roles: ['engineer'] } }, admin),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    const left = await scope
      .db('people')
      .join('person_roles', 'person_roles.person_id', 'people.id')
      .where({ 'people.shop_id': scope.shopId, 'people.active': true, role: 'admin' });
    expect(left).toHaveLength(1);
  });
});
