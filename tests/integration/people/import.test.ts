import { describe, expect, it } from 'vitest';
import { withdrawConsent } from '../../../src/features/message/withdrawal.service.ts';
import { importPeople, previewImport } from '../../../src/features/people/import.service.ts';
import { exportPeople } from '../../../src/features/people/people-file.service.ts';
import { addPerson } from '../../../src/features/people/person.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildPerson } from '../../builders/shop.ts';
import { admin, buildShopWithAdmin, describeAna, refusalOf } from './people-fixture.ts';

const encode = (text: string) => new TextEncoder().encode(text);

async function namesIn(scope: ShopScope): Promise<string[]> {
  const names: unknown[] = await scope.db('people').where({ shop_id: scope.shopId }).pluck('name');
  return names.map(String).sort();
}

function manyRows(count: number): string {
  return `name,language\n${Array.from({ length: count }, (_, row) => `Person ${row},en`).join('\n')}\n`;
}

describe('a list of people', () => {
  it('is looked at first and comes in as it was looked at', async () => {
    const { scope } = await buildShopWithAdmin();
    const file = encode('\uFEFFNombre;Teléfono;Función\r\n"Ruiz, Ana";202-555-0142;operario\r\nMinh;;\r\n');
    const preview = await previewImport(scope, file);
    expect(preview).toMatchObject({ rows: 2, fileFault: null, faultCount: 0, added: 0 });
    expect(await namesIn(scope)).toEqual(['Robin Vale']);

    const done = await importPeople(scope, file, preview.digest);
    expect(done.added).toBe(2);
    expect(await namesIn(scope)).toEqual(['Minh', 'Robin Vale', 'Ruiz, Ana']);
    const [line] = await listActivity(scope, { limit: 1 });
    expect(line).toMatchObject({ kind: 'people.imported', subject_id: preview.digest });
    expect(line?.details).not.toMatch(/Ruiz|555/);
  });

  it('with one bad row adds nobody, and names every bad row with its line', async () => {
    const { scope } = await buildShopWithAdmin();
    await addPerson(scope, describeAna(), admin);
    const other = await buildShopWithAdmin();
    await buildPerson(other.scope, ['engineer'], { email: 'taken@elsewhere.example' });
    const rows = [
      'name,phone,mail,role',
      'Lee,+12025550171,,',
      'Minh,12,,',
      'Ana again,+1 202 555 0142,,',
      'Lee twice,(202) 555-0171,,',
      'Sam,,taken@elsewhere.example,engineer',
      ',,,',
      'Jo,,,boss',
    ];
    const file = encode(rows.join('\n'));
    const preview = await previewImport(scope, file);
    expect(preview.faults.map(({ line, code }) => [line, code])).toEqual([
      [3, 'bad-phone'],
      [4, 'phone-here'],
      [5, 'same-phone'],
      [6, 'mail-here'],
      [8, 'bad-role'],
    ]);
    const before = await namesIn(scope);
    expect(await importPeople(scope, file, preview.digest)).toMatchObject({ added: 0, faultCount: 5 });
    expect(await namesIn(scope)).toEqual(before);
    await scope.db('people').where({ email: 'taken@elsewhere.example' }).update({ email: null });
  });

  it('must be the very file that was looked at', async () => {
    const { scope } = await buildShopWithAdmin();
    const { digest } = await previewImport(scope, encode('name\nAna\n'));
    for (const sent of [digest.replace(/^./, 'x'), undefined]) {
      expect((await refusalOf(importPeople(scope, encode('name\nAna\n'), sent))).code).toBe('file-changed');
    }
    expect((await refusalOf(importPeople(scope, encode('name\nAna\nLee\n'), digest))).code).toBe(
      'file-changed',
    );
    expect(await namesIn(scope)).toEqual(['Robin Vale']);
  });

  it('sent twice, at the same moment too, comes in once', async () => {
    const { scope } = await buildShopWithAdmin();
    const file = encode('name\nAna\nLee\n');
    const { digest } = await previewImport(scope, file);
    const outcomes = await Promise.allSettled([
      importPeople(scope, file, digest),
      importPeople(scope, file, digest),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    expect(await namesIn(scope)).toEqual(['Ana', 'Lee', 'Robin Vale']);
  });

  it('that somebody else made stale in the meantime adds nobody', async () => {
    const { scope } = await buildShopWithAdmin();
    const file = encode('name,phone\nLee,+12025550171\nAna,+12025550142\n');
    const { digest } = await previewImport(scope, file);
    await addPerson(scope, describeAna(), admin);
    expect(await importPeople(scope, file, digest)).toMatchObject({ added: 0, faultCount: 1 });
    expect(await namesIn(scope)).toEqual(['Ana Ruiz', 'Robin Vale']);
  });

  it('of 100,000 rows says how many there are and how many may come, and adds nobody', async () => {
    const { scope } = await buildShopWithAdmin();
    const file = encode(manyRows(100_000));
    const preview = await previewImport(scope, file);
    expect(preview).toMatchObject({ rows: 100_000, fileFault: 'too-many-rows', added: 0 });
    expect(await importPeople(scope, file, preview.digest)).toMatchObject({ added: 0 });
    expect(await namesIn(scope)).toEqual(['Robin Vale']);
  });

  it('of 5,000 rows comes in, one of 5,001 does not', async () => {
    const { scope } = await buildShopWithAdmin();
    expect((await previewImport(scope, encode(manyRows(5_001)))).fileFault).toBe('too-many-rows');
    const file = encode(manyRows(5_000));
    const { digest } = await previewImport(scope, file);
    expect((await importPeople(scope, file, digest)).added).toBe(5_000);
    expect(await namesIn(scope)).toHaveLength(5_001);
  });

  it.each([
    ['nothing', new Uint8Array(), 'empty'],
    ['headings alone', encode('name,phone\n'), 'empty'],
    ['no headings', encode('Ana,+12025550142\n'), 'no-headings'],
    ['letters of an old code page', Uint8Array.of(110, 97, 109, 101, 10, 0xb3, 0xf3, 100), 'not-utf8'],
    ['sixteen-bit letters', Uint8Array.of(0xff, 0xfe, 110, 0, 97, 0), 'not-utf8'],
    ['a workbook', Uint8Array.of(0x50, 0x4b, 3, 4, 0, 0), 'not-utf8'],
  ])('of %s is named for what it is', async (_, bytes, fileFault) => {
    const { scope } = await buildShopWithAdmin();
    expect(await previewImport(scope, bytes)).toMatchObject({ fileFault, added: 0 });
  });

  it('asks nobody, and knows who said STOP before', async () => {
    const { scope } = await buildShopWithAdmin();
    const { id, revision } = await addPerson(scope, describeAna(), admin);
    await inTransaction(scope, (inner) =>
      withdrawConsent(inner, { personId: id, phone: '+12025550142', how: 'text' }),
    );
    await scope.db('people').where({ id, revision }).update({ phone: null });
    const file = encode('name,phone\nAna,+12025550142\nLee,+12025550171\n');
    const { digest } = await previewImport(scope, file);
    await importPeople(scope, file, digest);
    const rows = await scope
      .db('people')
      .where({ shop_id: scope.shopId })
      .whereNotNull('phone')
      .orderBy('name_search');
    expect(rows.map((row) => row.consent)).toEqual(['opted out', 'unasked']);
    expect(await scope.db('messages').where({ shop_id: scope.shopId })).toEqual([]);
  });
});

describe('the list as a file', () => {
  it('makes no formula of a name and comes back as it was', async () => {
    const [from, to] = [await buildShopWithAdmin(), await buildShopWithAdmin()];
    await addPerson(from.scope, describeAna({ name: '=HYPERLINK("http://x")' }), admin);
    await from.scope.db('people').where({ id: from.adminId }).update({ active: false });
    const text = await exportPeople(from.scope);
    expect(text).not.toMatch(/(^|,|")[=+@-]/m);
    const file = encode(text);
    const { digest, faults } = await previewImport(to.scope, file);
    expect(faults).toEqual([]);
    await importPeople(to.scope, file, digest);
    expect(
      await to.scope.db('people').where({ shop_id: to.scope.shopId, phone: '+12025550142' }),
    ).toMatchObject([{ name: '=HYPERLINK("http://x")', language: 'es' }]);
  });
});
