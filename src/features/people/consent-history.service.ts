import { z } from 'zod';
import { listActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readNames } from './people.repository.ts';
import { type ConsentEvent, type ConsentStep, consentEvents } from './person-page.schema.ts';

const detailsSchema = z.object({ wording: z.number().optional() });
const linesRead = 200;

function readEvent(kind: string): ConsentEvent | undefined {
  return consentEvents.find((event) => kind === `consent.${event}`);
}

/** How consent came about, newest first: asked when and by whom, under which wording, given, withdrawn, lapsed. */
export async function readConsentHistory(scope: ShopScope, personId: string): Promise<ConsentStep[]> {
  const lines = await listActivity(scope, { limit: linesRead, subjectId: personId });
  const names = await readNames(
    scope,
    lines.flatMap((line) => (line.actor_kind === 'person' && line.actor_id ? [line.actor_id] : [])),
  );
  return lines.flatMap(({ kind, at, actor_id, details }) => {
    const event = readEvent(kind);
    if (!event) return [];
    const { wording = null } = detailsSchema.parse(JSON.parse(details));
    return [{ event, at, by: (actor_id && names.get(actor_id)) ?? null, wording }];
  });
}
