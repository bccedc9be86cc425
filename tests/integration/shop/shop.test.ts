import { describe, expect, it } from 'vitest';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { shopTables } from '../../../src/features/shop/remove-shop.repository.ts';
import { removeShop } from '../../../src/features/shop/remove-shop.service.ts';
import { changeShop, readShop } from '../../../src/features/shop/shop.service.ts';
import { checkActivityChain, listActivity } from '../../../src/server/db/activity-log.ts';
import { database } from '../../../src/server/db/connection.ts';
import { buildShop } from '../../builders/shop.ts';
import { buildRun } from '../../builders/trial.ts';
import { admin, buildShopWithAdmin, describeAna, refusalOf } from '../people/people-fixture.ts';

describe('the rules of the shop', () => {
  it('change as a whole or not at all, and the log keeps figures, not words', async () => {
    const { scope } = await buildShopWithAdmin();
    const { revision } = await readShop(scope);
    const changed = await changeShop(scope, {
      revision,
      name: 'Harrow Lane Foods',
      keepTextsDays: 60,
      quietFromMinute: 1320,
      quietToMinute: 300,
    });
    expect(changed).toMatchObject({ name: 'Harrow Lane Foods', keepTextsDays: 60, revision: revision + 1 });
    const [line] = await listActivity(scope, { limit: 1 });
    expect(line?.details).not.toContain('Harrow');
    expect(JSON.parse(line?.details ?? '{}')).toMatchObject({
      fields: ['keepTextsDays', 'name', 'quietFromMinute', 'quietToMinute'],
      values: { keepTextsDays: { before: 180, after: 60 } },
    });
  });

  it('are not changed by who saw an older state', async () => {
    const { scope } = await buildShopWithAdmin();
    const { revision } = await readShop(scope);
    await changeShop(scope, { revision, keepTextsDays: 60 });
    const error = await refusalOf(changeShop(scope, { revision, keepTextsDays: 90 }));
    expect(error.code).toBe('changed-meanwhile');
    expect(error.present).toMatchObject({ keepTextsDays: 60, revision: revision + 1 });
  });

  it('leave plans unseen only with a statement of who answers for safety', async () => {
    const { scope } = await buildShopWithAdmin();
    const { revision } = await readShop(scope);
    const error = await refusalOf(
      changeShop(scope, { revision, planReview: 'never', reviewStatement: 'me' }),
    );
    expect(error.fields).toEqual([{ pointer: '#/reviewStatement', code: 'statement-needed' }]);
    const reviewStatement = 'Robin Vale, plant manager, answers for safety.';
    const changed = await changeShop(scope, { revision, planReview: 'never', reviewStatement });
    expect(changed).toMatchObject({ planReview: 'never', reviewStatement });
  });

  it('take both quiet times or none', async () => {
    const { scope } = await buildShopWithAdmin();
    const { revision } = await readShop(scope);
    const error = await refusalOf(changeShop(scope, { revision, quietFromMinute: 60 }));
    expect(error.fields).toEqual([{ pointer: '#/quietToMinute', code: 'pair-needed' }]);
  });

  it('take no number of another shop and no number that is none', async () => {
    const { scope } = await buildShopWithAdmin();
    await buildShop({ text_number: '+12025550190' });
    const { revision } = await readShop(scope);
    for (const [textNumber, code] of [
      ['+12025550190', 'taken'],
      ['12', 'not-a-phone'],
    ] as const) {
      const error = await refusalOf(changeShop(scope, { revision, textNumber }));
      expect(error.fields).toEqual([{ pointer: '#/textNumber', code }]);
    }
  });
});

describe('removing a shop', () => {
  it('takes every row of it and none of another, and leaves the log guarded', async () => {
    const [gone, kept] = [await buildShopWithAdmin(), await buildShopWithAdmin()];
    for (const { scope } of [gone, kept]) {
      const { id } = await addPerson(scope, describeAna({ invite: true }), admin);
      await buildRun(scope, { personId: id, state: 'done' });
    }
    expect(await removeShop(database(), gone.scope.shopId)).toBe(true);
    for (const table of shopTables) {
      const rows = await database()(table).where({ shop_id: gone.scope.shopId });
      expect(rows, table).toEqual([]);
    }
    expect(await database()('people').where({ shop_id: kept.scope.shopId })).toHaveLength(3);
    expect(await checkActivityChain(kept.scope)).toMatchObject({ intact: true });
    await expect(database()('activity').where({ shop_id: kept.scope.shopId }).delete()).rejects.toThrow(
      /only grows/,
    );
  });

  it('is refused for a name that is nobody’s or two shops’', async () => {
    await buildShop({ name: 'Twice' });
    await buildShop({ name: 'Twice' });
    expect(await removeShop(database(), 'Twice')).toBe(false);
    expect(await removeShop(database(), 'No such shop')).toBe(false);
  });

  it('knows every table that has a shop', async () => {
    const tables: { name: string }[] = await database().raw(
      "select name from sqlite_master where type = 'table' and name not like 'sqlite_%'",
    );
    const owned: string[] = [];
    for (const { name } of tables) {
      const columns: { name: string }[] = await database().raw(`pragma table_info('${name}')`);
      if (columns.some((column) => column.name === 'shop_id')) owned.push(name);
    }
    expect(owned.sort()).toEqual([...shopTables].sort());
  });
});
