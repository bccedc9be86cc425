import type { ShopScope } from '../../server/db/scope.ts';
import { readConsentHistory } from './consent-history.service.ts';
import { findPersonInReach } from './find-person.service.ts';
import type { PersonPage } from './person-page.schema.ts';
import { toPublicPerson } from './public-person.ts';
import type { PeopleReader } from './reach.ts';

/** One person with the history of their consent, as far as the reader may see them. */
export async function readPersonPage(
  scope: ShopScope,
  id: string,
  reader: PeopleReader,
): Promise<PersonPage> {
  const person = await findPersonInReach(scope, id, reader);
  return { person: toPublicPerson(person, reader), consentHistory: await readConsentHistory(scope, id) };
}
