import { z } from 'zod';
import type { ShopScope } from '../../server/db/scope.ts';
import { type ConversationState, conversationStates } from './text-reading.ts';

const rowSchema = z.object({ state: z.enum(conversationStates), revision: z.number() });

/** Where the talk with a person's phone stands; `unasked` before anything was said. */
export async function readConversation(
  scope: ShopScope,
  personId: string,
): Promise<z.output<typeof rowSchema>> {
  const found = await scope
    .db('conversations')
    .where({ shop_id: scope.shopId, person_id: personId })
    .first('state', 'revision');
  return found ? rowSchema.parse(found) : { state: 'unasked', revision: 0 };
}

/** Moves the talk on; the run, reading and prompt it was about are let go. */
export async function moveConversation(
  scope: ShopScope,
  move: { id: string; personId: string; state: ConversationState },
): Promise<void> {
  const { db, shopId } = scope;
  const cleared = { state: move.state, run_id: null, reading_id: null, prompt_message_id: null };
  await db('conversations')
    .insert({ id: move.id, shop_id: shopId, person_id: move.personId, ...cleared })
    .onConflict(['shop_id', 'person_id'])
    .merge({ ...cleared, revision: db.raw('conversations.revision + 1') });
}
