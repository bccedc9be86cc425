import { DateTime } from 'luxon';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findShop } from '../shop/shop.repository.ts';
import { type MonthlyTexts, standingOf } from './monthly-texts.ts';
import { countTextsSent } from './text-count.repository.ts';

/** How much of the month's texts is used, in the shop's own month; null where it has set no limit. */
export async function readMonthlyTexts(scope: ShopScope): Promise<MonthlyTexts | null> {
  const { monthlyTextLimit: limit, timeZone: zone } = await findShop(scope);
  if (limit === null) return null;
  const since = DateTime.fromMillis(now(), { zone }).startOf('month').toMillis();
  const { parts: used } = await countTextsSent(scope, { since });
  return { used, limit, standing: standingOf(used, limit) };
}

/** Whether runs are no longer sent by text this month: they wait on the board and on paper. Safety texts always go. */
export async function areTextsUsedUp(scope: ShopScope): Promise<boolean> {
  return (await readMonthlyTexts(scope))?.standing === 'used up';
}
