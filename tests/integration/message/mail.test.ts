import { describe, expect, it } from 'vitest';
import { queueMailTo, queueMessage } from '../../../src/features/message/message.service.ts';
import { database } from '../../../src/server/db/connection.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { message, openCrew, passTime } from './crew.ts';

const crew = openCrew({ consent: 'agreed' });

describe('mail', () => {
  it('goes out in the language of its reader, and its link is not kept', async () => {
    await database()('people').where({ id: crew.ana }).update({ language: 'pl' });
    const { email } = await database()('people').where({ id: crew.ana }).first('email');
    const link = 'https://trywell.example/invite/secret-of-this-mail';
    await inTransaction(crew.shop, (inside) =>
      queueMessage(inside, {
        template: 'invitation',
        params: { shop: 'Harrow Lane Foods', inviter: 'Dana', link, days: 7 },
        personId: crew.ana,
        dedupe: 'invitation:1',
      }),
    );
    expect((await message(crew, 'invitation:1')).body).toContain(link);
    await crew.desk.work();
    const mail = (await crew.desk.mails()).find(({ recipients }) => recipients[0] === email);
    expect(mail?.subject).toBe('Dana zaprasza Cię do Harrow Lane Foods w Trywell');
    expect(mail?.text).toContain(link);
    const kept = await message(crew, 'invitation:1');
    expect(kept).toMatchObject({ state: 'sent', body: '', params: '{"v":1}' });
    expect(JSON.stringify(kept)).not.toContain('secret-of-this-mail');
  });

  it('goes again when the server is busy, and to a former address where that is meant', async () => {
    await crew.desk.setFaults({ refuseNextMails: { count: 1, code: 451 } });
    await inTransaction(crew.shop, (inside) =>
      queueMailTo(inside, {
        template: 'emailChanged',
        params: { name: 'Ana', shop: 'Harrow Lane Foods' },
        address: 'former@shop.example',
        language: 'es',
        personId: crew.ana,
        dedupe: 'changed:1',
      }),
    );
    await crew.desk.work();
    expect(await message(crew, 'changed:1')).toMatchObject({ state: 'waiting', error_code: '451' });
    await passTime(7_000);
    await crew.desk.work();
    expect(await message(crew, 'changed:1')).toMatchObject({ state: 'sent', attempts: 2 });
    expect((await crew.desk.mails()).map(({ recipients }) => recipients[0])).toContain('former@shop.example');
  });
});
