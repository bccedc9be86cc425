import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findPerson } from './person.repository.ts';
import type { Person } from './person.ts';
import { isWithinReach, type PeopleReader } from './reach.ts';

/**
 * A person of the shop whom the reader may see.
 * @throws AppError `not-found` for a foreign or unknown id, `forbidden` for a known person beyond the reach
 */
export async function findPersonInReach(scope: ShopScope, id: string, reader: PeopleReader): Promise<Person> {
  const person = await findPerson(scope, id);
  if (!person) throw new AppError('not-found');
  if (!isWithinReach(person, reader.reach)) throw new AppError('forbidden', { detail: 'beyond reach' });
  return person;
}
