import { translatorFor } from '../../i18n/translator.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { forgetTextsOfPerson } from '../message/retention.service.ts';
import { findShop } from '../shop/shop.repository.ts';
import {
  blankRemarksOfPerson,
  erasedColumns,
  nextFormerNumber,
  removeBelongings,
  removePhotosOfPerson,
} from './erase.repository.ts';
import { findPersonInReach } from './find-person.service.ts';
import { holdsNoOpenRun, leavesAnAdmin, updatePerson } from './person.repository.ts';
import { isOperatorOnly, type Person } from './person.ts';
import type { PeopleReader } from './reach.ts';
import { explainRefusedChange } from './refused-change.service.ts';

async function writeFormerName(scope: ShopScope, person: Person): Promise<string> {
  const t = translatorFor((await findShop(scope)).language);
  const number = await nextFormerNumber(scope);
  return t(isOperatorOnly(person) ? 'people:former.operator' : 'people:former.colleague', { number });
}

/**
 * Takes out of the shop whatever tells who somebody was. Readings, runs and the log keep the row, which then goes by a
 * number. An opt-out stays with the phone number, as a hash. This cannot be undone.
 * @throws AppError `open-runs`, `last-admin`, `changed-meanwhile`
 */
export function erasePerson(
  scope: ShopScope,
  which: { id: string; revision: number },
  reader: PeopleReader,
): Promise<Person> {
  return inTransaction(scope, async (inner) => {
    const person = await findPersonInReach(inner, which.id, reader);
    const details = { before: person.roles, after: [] };
    await recordActivity(inner, { kind: 'person.erased', subjectId: which.id, details });
    const name = await writeFormerName(inner, person);
    await forgetTextsOfPerson(inner, which.id);
    const countsAsAdmin = person.active && person.roles.includes('admin');
    const only = countsAsAdmin ? [holdsNoOpenRun, leavesAnAdmin] : [holdsNoOpenRun];
    if (!(await updatePerson(inner, which, { columns: erasedColumns(name), only }))) {
      throw await explainRefusedChange(inner, { ...which, leaves: true, reader });
    }
    await removeBelongings(inner, which.id);
    await blankRemarksOfPerson(inner, which.id);
    await removePhotosOfPerson(inner, which.id);
    return findPersonInReach(inner, which.id, { ...reader, reach: 'everybody' });
  });
}
