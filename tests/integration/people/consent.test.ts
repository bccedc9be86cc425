import { describe, expect, it } from 'vitest';
import {
  agreeToTexts,
  declineTexts,
  noteConsentAsked,
  reopenConsent,
  withdrawConsent,
} from '../../../src/features/people/consent.service.ts';
import { findPerson } from '../../../src/features/people/person.repository.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { inTransaction } from '../../../src/server/db/in-transaction.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

async function build(consent = 'unasked') {
  const shop = await buildShop();
  const asker = await buildPerson(shop, ['admin']);
  const scope = { ...shop, actor: { kind: 'person' as const, id: asker } };
  const id = await buildPerson(shop, ['operator'], { phone: '+12025550142', consent });
  return { scope, id, asker };
}

describe('consent', () => {
  it('is asked for, given and withdrawn, each with who, when, how and under which wording', async () => {
    const { scope, id, asker } = await build();
    expect(await inTransaction(scope, (inner) => noteConsentAsked(inner, id))).toBe(true);
    const asked = await findPerson(scope, id);
    expect(asked).toMatchObject({ consent: 'asked', consentWording: 1, consentHow: 'text', askedBy: asker });
    expect(await agreeToTexts(scope, id)).toBe(true);
    expect(await withdrawConsent(scope, id)).toBe(true);
    expect((await findPerson(scope, id))?.consent).toBe('opted out');

    const lines = await listActivity(scope, { limit: 10, subjectId: id });
    expect(lines.map((line) => [line.kind, JSON.parse(line.details)])).toEqual([
      ['consent.withdrawn', { v: 1, wording: 1, way: 'text' }],
      ['consent.agreed', { v: 1, wording: 1, way: 'text' }],
      ['consent.asked', { v: 1, wording: 1, way: 'text' }],
    ]);
  });

  it('is not given without a question', async () => {
    const { scope, id } = await build();
    expect(await agreeToTexts(scope, id)).toBe(false);
    expect((await findPerson(scope, id))?.consent).toBe('unasked');
  });

  it('may be asked for again after a no, and not after STOP', async () => {
    const { scope, id } = await build('asked');
    expect(await declineTexts(scope, id)).toBe(true);
    expect(await inTransaction(scope, (inner) => noteConsentAsked(inner, id))).toBe(true);
    await withdrawConsent(scope, id);
    expect(await inTransaction(scope, (inner) => noteConsentAsked(inner, id))).toBe(false);
    expect(await agreeToTexts(scope, id)).toBe(false);
  });

  it('is open to a new question after START, which is no yes', async () => {
    const { scope, id } = await build('opted out');
    expect(await reopenConsent(scope, id)).toBe(true);
    expect((await findPerson(scope, id))?.consent).toBe('unasked');
    expect(await agreeToTexts(scope, id)).toBe(false);
  });

  it('that is withdrawn takes back every text that has not left', async () => {
    const { scope, id } = await build('agreed');
    const message = (state: string, urgent: boolean) => ({
      id: newId(),
      shop_id: scope.shopId,
      channel: 'text',
      template: 'prompt',
      template_version: 1,
      params: '{"v":1}',
      language: 'en',
      recipient: '+12025550142',
      body: 'Run 4',
      person_id: id,
      dedupe: newId(),
      urgent,
      state,
      not_before: 0,
      created_at: 0,
    });
    await scope.db('messages').insert([message('waiting', true), message('waiting', false)]);
    await scope.db('messages').insert(message('sent', false));
    await withdrawConsent(scope, id);
    const states = await scope.db('messages').where({ person_id: id }).orderBy('state').pluck('state');
    expect(states).toEqual(['cancelled', 'cancelled', 'sent']);
  });
});
