import type { TrialReader } from '../../../src/features/trial/trial-reader.service.ts';
import { makeVerdict } from '../../../src/features/verdict/make-verdict.service.ts';
import type { ShopScope } from '../../../src/server/db/scope.ts';
import { buildMeasuredTrial, type ReadRun } from '../../builders/measured-trial.ts';
import { buildPerson, buildShop } from '../../builders/shop.ts';

/** Hotter is 8 N stronger, with small ups and downs that are the same each time. */
export const hotter: ReadRun = ({ coded, order }) =>
  35 + 4 * (coded[0] ?? 0) + 0.55 * Math.sin(order * 12.9898);

export interface Stand {
  scope: ShopScope;
  reader: TrialReader;
}

/** A shop with one person who may plan, run, decide and audit. */
export async function buildStand(): Promise<Stand> {
  const shop = await buildShop();
  const roles = ['supervisor', 'engineer'] as const;
  const personId = await buildPerson(shop, roles, { name: 'Odila Quist' });
  return { scope: { ...shop, actor: { kind: 'person', id: personId } }, reader: { personId, roles } };
}

/** A trial with its readings and its first verdict. */
export async function buildJudgedTrial(stand: Stand, read: ReadRun = hotter): Promise<string> {
  const id = await buildMeasuredTrial(stand.scope, { ownerId: stand.reader.personId, read });
  await makeVerdict(stand.scope, id);
  return id;
}
