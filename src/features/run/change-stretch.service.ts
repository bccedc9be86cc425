import { recordActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { touchBoard } from './run.repository.ts';
import { insertStretch } from './stretch.repository.ts';
import type { ChangeKind } from './stretch.ts';

export interface SaidChange {
  kind: ChangeKind;
  /** The batch's name or number, or what was done. */
  words: string;
}

/** Writes down that something changed, in the transaction at hand: runs made from now on are a stretch of their own. */
export async function beginStretch(scope: ShopScope, trialId: string, change: SaidChange): Promise<void> {
  const n = await insertStretch(scope, { trialId, ...change });
  await touchBoard(scope, trialId);
  await recordActivity(scope, {
    kind: 'trial.something-changed',
    subjectId: trialId,
    trialId,
    details: { n, kind: change.kind },
  });
}
