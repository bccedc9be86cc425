import type { ShopScope } from '../../server/db/scope.ts';
import { countPeople, listPeoplePage, type PeoplePage } from './people.repository.ts';
import type { ListPeople } from './people.schema.ts';
import type { PeopleReader } from './reach.ts';

/** One page of the people whom the reader may see. */
export function listPeople(scope: ShopScope, list: ListPeople, reader: PeopleReader): Promise<PeoplePage> {
  return listPeoplePage(scope, { ...list, operatorsOnly: reader.reach === 'operators' });
}

/** How many people the reader may see at all, whatever is searched for. */
export function countVisiblePeople(scope: ShopScope, reader: PeopleReader): Promise<number> {
  return countPeople(scope, { operatorsOnly: reader.reach === 'operators' });
}
