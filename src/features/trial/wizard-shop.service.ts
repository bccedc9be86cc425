import type { ShopScope } from '../../server/db/scope.ts';
import { listPeoplePage } from '../people/people.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { CrewMember, WizardShop } from './wizard/wizard-context.ts';

const peopleAtATime = 100;

/** Everybody who is on the crew or signs in now, by name: with nothing that the wizard has no use for. */
async function listCrew(scope: ShopScope): Promise<CrewMember[]> {
  const crew: CrewMember[] = [];
  let after: string | undefined;
  do {
    const page = await listPeoplePage(scope, {
      search: '',
      show: 'active',
      sort: 'name',
      direction: 'ascending',
      limit: peopleAtATime,
      operatorsOnly: false,
      ...(after === undefined ? {} : { after }),
    });
    for (const { id, kind, name, language, roles, safetyPerson, consent, consentAt } of page.people) {
      crew.push({ id, kind, name, language, roles, safetyPerson, consent, consentAt });
    }
    after = page.next ?? undefined;
  } while (after !== undefined);
  return crew;
}

/** What the wizard knows of the shop. */
export async function readWizardShop(scope: ShopScope): Promise<WizardShop> {
  const { name, currency, timeZone, planReview } = await findShop(scope);
  return { name, currency, timeZone, planReview, people: await listCrew(scope) };
}
