import { revokeLinks } from '../../server/auth/links.ts';
import { endAllSessions } from '../../server/auth/session.ts';
import { now } from '../../server/clock.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { isPhoneSuppressed, suppressPhone } from '../message/addressee.repository.ts';
import { changeConsent } from '../message/consent.repository.ts';
import { forgetConsentOfOldNumber } from '../message/consent.service.ts';
import { queueMailTo } from '../message/message.service.ts';
import { findShop } from '../shop/shop.repository.ts';
import { findPersonInReach } from './find-person.service.ts';
import { leavesAnAdmin, replaceRoles, updatePerson } from './person.repository.ts';
import { type ChangePerson, type PersonFields, personFaults } from './person.schema.ts';
import type { Person } from './person.ts';
import { revokeLinksOf } from './person-access.service.ts';
import { checkPhone, refuseTaken } from './person-contacts.service.ts';
import { isWithinReach, type PeopleReader } from './reach.ts';
import { explainRefusedChange } from './refused-change.service.ts';

type Change = Partial<PersonFields>;
type Wish = { [Field in keyof PersonFields]?: PersonFields[Field] | undefined };

/** Fields that really differ from what is stored. */
function differing(before: Person, wished: Wish): Change {
  return Object.fromEntries(
    Object.entries(wished).filter(
      ([field, value]) =>
        value !== undefined && JSON.stringify(value) !== JSON.stringify(before[field as keyof PersonFields]),
    ),
  );
}

/** What the person's own doors and messages need after a change, in its transaction. */
async function followUp(scope: ShopScope, before: Person, change: Change): Promise<void> {
  if (change.roles) {
    await replaceRoles(scope, before.id, change.roles);
    await endAllSessions(scope, before.id);
    const details = { before: before.roles, after: change.roles };
    await recordActivity(scope, { kind: 'person.roles-changed', subjectId: before.id, details });
  }
  if (change.email !== undefined) await followNewAddress(scope, before);
  if (change.phone !== undefined) await followNewNumber(scope, before, change.phone);
}

async function followNewAddress(scope: ShopScope, before: Person): Promise<void> {
  await recordActivity(scope, { kind: 'person.mail-changed', subjectId: before.id });
  if (before.email === null) return;
  // What was mailed to the old address must open nothing any more, and its owner must hear of the change.
  await revokeLinksOf(scope, before.id, ['invite', 'reset', 'sign-in']);
  const shop = await findShop(scope);
  await queueMailTo(scope, {
    template: 'emailChanged',
    params: { name: before.name, shop: shop.name },
    address: before.email,
    language: before.language,
    personId: before.id,
    dedupe: `email-changed:${before.id}:${before.revision}`,
  });
}

async function followNewNumber(scope: ShopScope, before: Person, phone: string | null): Promise<void> {
  if (before.phone !== null && before.consent === 'opted out') {
    await suppressPhone(scope, { id: newId(), phone: before.phone, at: now() });
  }
  await revokeLinks(scope, { purpose: 'operator', personId: before.id });
  await forgetConsentOfOldNumber(scope, before.id);
  if (phone !== null && (await isPhoneSuppressed(scope, phone))) {
    await changeConsent(scope, before.id, { consent: 'opted out' }, now());
  }
}

/** What somebody who only invites operators may not do to one. */
function refuseBeyondReach(change: Change, reader: PeopleReader): void {
  if (reader.reach === 'everybody') return;
  const raises = change.roles !== undefined && !isWithinReach({ roles: change.roles }, reader.reach);
  if (raises || change.safetyPerson !== undefined) {
    throw new AppError('forbidden', { detail: 'may only change what an operator is' });
  }
}

/**
 * Changes somebody, if they are still as the reader saw them. A new number must say OK again; new roles end sessions; a
 * new mail address is told to the old one.
 * @throws AppError `invalid` naming the field, `changed-meanwhile` with the present state, `last-admin`, `forbidden`
 */
export async function changePerson(
  scope: ShopScope,
  which: { id: string; input: ChangePerson },
  reader: PeopleReader,
): Promise<Person> {
  const { revision, ...typed } = which.input;
  const wished: Wish =
    typed.phone === undefined ? typed : { ...typed, phone: await checkPhone(scope, typed.phone) };
  return inTransaction(scope, async (inner) => {
    const before = await findPersonInReach(inner, which.id, reader);
    const change = differing(before, wished);
    refuseBeyondReach(change, reader);
    const faults = personFaults({ ...before, ...change });
    if (faults.length > 0) {
      throw new AppError('invalid', {
        fields: faults.map(({ field, code }) => ({ pointer: `#/${field}`, code })),
      });
    }
    await refuseTaken(inner, {
      phone: change.phone ?? null,
      email: change.email ?? null,
      exceptId: which.id,
    });
    // Before the change, because its line locks the shop: see `deactivatePerson`.
    await recordActivity(inner, {
      kind: 'person.changed',
      subjectId: which.id,
      details: { fields: Object.keys(change).sort() },
    });
    const stepsDown =
      before.active && before.roles.includes('admin') && change.roles?.includes('admin') === false;
    const only = stepsDown ? [leavesAnAdmin] : [];
    if (!(await updatePerson(inner, { id: which.id, revision }, { fields: change, only }))) {
      throw await explainRefusedChange(inner, { id: which.id, revision, leaves: false, reader });
    }
    await followUp(inner, before, change);
    return findPersonInReach(inner, which.id, reader);
  });
}
