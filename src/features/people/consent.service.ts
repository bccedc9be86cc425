import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { cancelWaitingTexts, moveConsent, releasePhone } from './consent.repository.ts';
import { type ConsentEvent, type ConsentWay, consentSteps, consentWording } from './consent.ts';
import { findPerson } from './person.repository.ts';

async function move(
  scope: ShopScope,
  personId: string,
  event: ConsentEvent,
  about: { way: ConsentWay; columns?: Record<string, unknown> },
): Promise<boolean> {
  const { columns } = about;
  const moved = await moveConsent(scope, personId, {
    ...consentSteps[event],
    ...(columns ? { columns } : {}),
  });
  if (!moved) return false;
  const details = { wording: moved.wording, way: about.way };
  await recordActivity(scope, { kind: event, subjectId: personId, details });
  return true;
}

/** Notes that the consent question goes out, in the transaction that queues it. @returns whether it may */
export function noteConsentAsked(scope: ShopScope, personId: string): Promise<boolean> {
  const askedBy = scope.actor.kind === 'person' ? scope.actor.id : null;
  const columns = { consent_wording: consentWording, consent_how: 'text', asked_by: askedBy };
  return move(scope, personId, 'consent.asked', { way: 'text', columns });
}

/** OK to the consent question. @returns whether a question was open */
export function agreeToTexts(scope: ShopScope, personId: string, way: ConsentWay = 'text'): Promise<boolean> {
  const columns = { consent_how: way };
  return inTransaction(scope, (inner) => move(inner, personId, 'consent.agreed', { way, columns }));
}

/** A plain no to the consent question. They may be asked again; STOP is what ends that. */
export function declineTexts(scope: ShopScope, personId: string, way: ConsentWay = 'text'): Promise<boolean> {
  return inTransaction(scope, (inner) => move(inner, personId, 'consent.declined', { way }));
}

/** STOP: nothing more goes out, not even what was waiting. */
export function withdrawConsent(
  scope: ShopScope,
  personId: string,
  way: ConsentWay = 'text',
): Promise<boolean> {
  return inTransaction(scope, async (inner) => {
    await cancelWaitingTexts(inner, personId);
    return move(inner, personId, 'consent.withdrawn', { way });
  });
}

/** START from the number itself: the question may be asked again. Nothing else goes out before a new OK. */
export function reopenConsent(scope: ShopScope, personId: string): Promise<boolean> {
  return inTransaction(scope, async (inner) => {
    const person = await findPerson(inner, personId);
    if (!person?.phone) return false;
    await releasePhone(inner, person.phone);
    return move(inner, personId, 'consent.reopened', { way: 'text' });
  });
}
