import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import { isPhoneSuppressed } from '../message/addressee.repository.ts';
import { findPersonInReach } from './find-person.service.ts';
import { inviteWithin } from './invite-person.service.ts';
import { holdsNoOpenRun, insertPerson, leavesAnAdmin, updatePerson } from './person.repository.ts';
import type { AddPerson } from './person.schema.ts';
import type { Person } from './person.ts';
import { endAccess } from './person-access.service.ts';
import { checkPhone, refuseTaken } from './person-contacts.service.ts';
import { isWithinReach, type PeopleReader } from './reach.ts';
import { explainRefusedChange } from './refused-change.service.ts';

/**
 * Adds somebody to the shop, and invites them if wished. The same id again adds nobody and answers who is there.
 * @throws AppError `invalid` naming the field; `forbidden` for more than an operator by somebody who only invites operators
 */
export async function addPerson(scope: ShopScope, input: AddPerson, reader: PeopleReader): Promise<Person> {
  if (!isWithinReach(input, reader.reach) || (reader.reach === 'operators' && input.safetyPerson)) {
    throw new AppError('forbidden', { detail: 'may only add operators' });
  }
  const { invite, id = newId(), ...fields } = input;
  const phone = await checkPhone(scope, fields.phone);
  return inTransaction(scope, async (inner) => {
    const isSuppressed = phone !== null && (await isPhoneSuppressed(inner, phone));
    const person = { ...fields, phone, id, consent: isSuppressed ? 'opted out' : 'unasked' } as const;
    await refuseTaken(inner, { phone, email: fields.email, exceptId: id });
    if (await insertPerson(inner, person)) {
      await recordActivity(inner, {
        kind: 'person.added',
        subjectId: id,
        details: { kind: fields.kind, safetyPerson: fields.safetyPerson, before: [], after: fields.roles },
      });
      if (invite) await inviteWithin(inner, await findPersonInReach(inner, id, reader));
    }
    return findPersonInReach(inner, id, reader);
  });
}

interface Which {
  id: string;
  /** The state the reader saw. */
  revision: number;
}

/**
 * Takes somebody off the crew: no texts, no sign-in. Their open runs must have been handed over.
 * @throws AppError `open-runs` naming them, `last-admin`, `changed-meanwhile` with the present state
 */
export function deactivatePerson(scope: ShopScope, which: Which, reader: PeopleReader): Promise<Person> {
  return inTransaction(scope, async (inner) => {
    const person = await findPersonInReach(inner, which.id, reader);
    // The line in the log comes first: it locks the shop, so that two admins who leave at once do so one by one.
    await recordActivity(inner, { kind: 'person.deactivated', subjectId: which.id });
    const only = person.roles.includes('admin') ? [holdsNoOpenRun, leavesAnAdmin] : [holdsNoOpenRun];
    const state = { ...which, active: true };
    if (!(await updatePerson(inner, state, { columns: { active: false }, only }))) {
      throw await explainRefusedChange(inner, { ...state, leaves: true, reader });
    }
    await endAccess(inner, which.id);
    return findPersonInReach(inner, which.id, reader);
  });
}

/** Puts somebody back on the crew, with the consent they gave before. */
export function activatePerson(scope: ShopScope, which: Which, reader: PeopleReader): Promise<Person> {
  return inTransaction(scope, async (inner) => {
    await findPersonInReach(inner, which.id, reader);
    const state = { ...which, active: false };
    if (!(await updatePerson(inner, state, { columns: { active: true } }))) {
      throw await explainRefusedChange(inner, { ...state, leaves: false, reader });
    }
    await recordActivity(inner, { kind: 'person.activated', subjectId: which.id });
    return findPersonInReach(inner, which.id, reader);
  });
}
