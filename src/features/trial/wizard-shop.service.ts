import type { Translate } from '../../i18n/translator.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { describeHours } from '../people/describe-hours.ts';
import { listPeoplePage } from '../people/people.repository.ts';
import { findShop } from '../shop/shop.repository.ts';
import type { CrewMember, WizardShop } from './wizard/wizard-context.ts';

const peopleAtATime = 100;

/** Everybody who is on the crew or signs in now, by name: with nothing that the wizard has no use for. */
async function listCrew(scope: ShopScope, t: Translate): Promise<CrewMember[]> {
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
    for (const person of page.people) {
      const { id, kind, name, language, roles, safetyPerson, consent, consentAt, workSpans } = person;
      const textingHours = workSpans.length === 0 ? [] : describeHours(workSpans, t);
      crew.push({ id, kind, name, language, roles, safetyPerson, consent, consentAt, textingHours });
    }
    after = page.next ?? undefined;
  } while (after !== undefined);
  return crew;
}

/** What the wizard knows of the shop, in the reader's language. */
export async function readWizardShop(scope: ShopScope, t: Translate): Promise<WizardShop> {
  const { name, currency, timeZone, planReview } = await findShop(scope);
  return { name, currency, timeZone, planReview, people: await listCrew(scope, t) };
}
