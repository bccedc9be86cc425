import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { config } from '../../server/env.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { askForConsent } from '../message/consent.service.ts';
import { queueMessage } from '../message/message.service.ts';
import { inboundWebhookPath } from '../message/text-gateway.ts';
import { findPerson } from '../people/person.repository.ts';
import type { Person } from '../people/person.ts';
import { findShop } from './shop.repository.ts';
import { findAnswerSince, findCheckText } from './texts-check.repository.ts';
import type { TextsCheck } from './texts-check.schema.ts';
import { judgeCheck } from './texts-check.ts';

async function findOwnSelf(scope: ShopScope): Promise<Person> {
  const self = scope.actor.id === null ? null : await findPerson(scope, scope.actor.id);
  if (!self) throw new RangeError('textsCheck: scope.actor is not a person of the shop');
  return self;
}

/** How far the admin's own check has got. */
export async function readTextsCheck(scope: ShopScope): Promise<TextsCheck> {
  const self = await findOwnSelf(scope);
  const text = await findCheckText(scope, self.id);
  const answer = text ? await findAnswerSince(scope, self.id, text.createdAt) : null;
  const steps = judgeCheck(text, answer, now());
  return {
    sender: (await findShop(scope)).textNumber,
    webhook: new URL(inboundWebhookPath, config().appUrl).href,
    personId: self.id,
    phone: self.phone,
    consent: self.consent,
    startedAt: text?.createdAt ?? null,
    code: text?.errorCode ?? null,
    steps,
    isDone: Object.values(steps).every(({ state }) => state === 'good'),
  };
}

/**
 * Texts the admin who asks. Before they have agreed to texts it is the question that goes out: whoever answers it has
 * checked both ways too.
 * @throws AppError `not-now` without a number of their own, without the shop's, or after their STOP
 */
export async function startTextsCheck(scope: ShopScope): Promise<TextsCheck> {
  await inTransaction(scope, async (inner) => {
    const self = await findOwnSelf(inner);
    const shop = await findShop(inner);
    if (self.phone === null || shop.textNumber === null || self.consent === 'opted out') {
      throw new AppError('not-now', { detail: 'no number to text, or none to text from' });
    }
    if (self.consent === 'agreed') {
      const params = { shop: shop.name };
      const dedupe = `texts-check:${newId()}`;
      await queueMessage(inner, { template: 'textsCheck', params, personId: self.id, dedupe });
    } else {
      await askForConsent(inner, self.id, { id: self.id, name: self.name });
    }
    await recordActivity(inner, { kind: 'shop.texts-checked', subjectId: inner.shopId });
  });
  return readTextsCheck(scope);
}
