import type { Knex } from 'knex';
import type { Answers } from '../../../src/features/trial/answers.schema.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildRunningTrial } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

export const runsATrial = 11;

/** One operator with a phone and a trial of their own. */
export interface CrowdMember {
  phone: string;
  /** The shop's number. */
  number: string;
  shopId: string;
  personId: string;
  trialId: string;
}

const number = (id: string, panelName: string, low: string, high: string, usual: string) =>
  ({ id, kind: 'number', name: panelName, panelName, unit: '', low, high, usual }) as const;

/** Three settings by number: eleven runs, one strength each, at any hour. */
function crowdAnswers(runs: string): Answers {
  return {
    hazards: { none: true, ticked: [] },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '1' },
    settings: {
      settings: [
        number('temp', 'JAW TEMP', '140', '160', '150'),
        number('dwell', 'DWELL', '0.6', '1', '0.8'),
        number('press', 'PRESS', '3', '4', '3.5'),
      ],
    },
    neverRun: { mixes: [] },
    spare: { runs: String(runsATrial), hoursOpen: true, moneyOpen: true },
    pace: { next: 'made', remindMinutes: '1000' },
    crew: { shifts: [{ id: 'day', name: 'Day', runs }] },
  };
}

async function addMember(scope: ShopScope, shopNumber: string, n: number): Promise<CrowdMember> {
  const phone = `+1312555${String(1000 + n)}`;
  const name = `Operator ${n}`;
  const personId = await buildPerson(scope, ['operator'], {
    ...{ name, phone, email: null, consent: 'agreed' },
  });
  const ownerId = await buildPerson(scope, ['supervisor'], { email: `owner${n}@crowd.example` });
  const trialId = await buildRunningTrial(scope, { ownerId, seed: n + 1, answers: crowdAnswers(personId) });
  return { phone, number: shopNumber, shopId: scope.shopId, personId, trialId };
}

/**
 * Shops full of operators, each with a running trial; nothing has been texted yet.
 * @param size.each operators in a shop
 */
export async function buildCrowd(db: Knex, size: { shops: number; each: number }): Promise<CrowdMember[]> {
  const members: CrowdMember[] = [];
  for (let place = 0; place < size.shops; place += 1) {
    const shopNumber = `+1773555${String(1000 + place)}`;
    const scope = await buildShop({ name: `Crowd ${place}`, text_number: shopNumber }, db);
    for (let one = 0; one < size.each; one += 1) {
      members.push(await addMember(scope, shopNumber, members.length));
    }
  }
  return members;
}
