import { listActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readNames } from '../people/people.repository.ts';
import { type ActivityPage, activityLineSchema, type ListActivity } from './activity.schema.ts';

/**
 * What happened in the shop, newest first, to answer "who changed this, and when". It is never cut or counted by person.
 */
export async function readActivity(scope: ShopScope, list: ListActivity): Promise<ActivityPage> {
  const rows = await listActivity(scope, {
    limit: list.limit + 1,
    ...(list.before === undefined ? {} : { before: list.before }),
    ...(list.trial === undefined ? {} : { trialId: list.trial }),
  });
  const shown = rows.slice(0, list.limit);
  const ids = shown.flatMap((row) => [row.actor_id, row.subject_id]).filter((id) => id !== null);
  const names = await readNames(scope, [...new Set(ids)]);
  const nameOf = (id: string | null) => (id === null ? null : (names.get(id) ?? null));
  return {
    lines: shown.map((row) =>
      activityLineSchema.parse({
        seq: row.seq,
        at: row.at,
        kind: row.kind,
        actor: { kind: row.actor_kind, name: row.actor_kind === 'person' ? nameOf(row.actor_id) : null },
        subject: nameOf(row.subject_id),
        trialId: row.trial_id,
        details: row.details,
      }),
    ),
    next: rows.length > list.limit ? (shown.at(-1)?.seq ?? null) : null,
  };
}
