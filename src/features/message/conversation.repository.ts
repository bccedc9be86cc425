import { z } from 'zod';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { type ConversationState, conversationStates } from './text-reading.ts';

const rowSchema = z
  .object({
    state: z.enum(conversationStates),
    run_id: z.string().nullable(),
    reading_id: z.string().nullable(),
    prompt_message_id: z.string().nullable(),
    revision: z.number(),
  })
  .transform((row) => ({
    state: row.state,
    /** The run that is spoken of. */
    runId: row.run_id,
    /** The first of the readings that a question is about. */
    readingId: row.reading_id,
    /** The message that the next text answers. */
    promptMessageId: row.prompt_message_id,
    revision: row.revision,
  }));
export type Conversation = z.output<typeof rowSchema>;

const nothingSaid: Conversation = {
  state: 'unasked',
  runId: null,
  readingId: null,
  promptMessageId: null,
  revision: 0,
};

/** Where the talk with a person's phone stands; `unasked` before anything was said. */
export async function readConversation(scope: ShopScope, personId: string): Promise<Conversation> {
  const found: unknown = await scope
    .db('conversations')
    .where({ shop_id: scope.shopId, person_id: personId })
    .first();
  return found ? rowSchema.parse(found) : nothingSaid;
}

/** Moves the talk on; a run, reading or prompt that is not named is let go. */
export async function moveConversation(
  scope: ShopScope,
  move: {
    id: string;
    personId: string;
    state: ConversationState;
    runId?: string | null;
    readingId?: string | null;
    promptMessageId?: string | null;
  },
): Promise<void> {
  const { db, shopId } = scope;
  const set = {
    state: move.state,
    run_id: move.runId ?? null,
    reading_id: move.readingId ?? null,
    prompt_message_id: move.promptMessageId ?? null,
  };
  await db('conversations')
    .insert({ id: move.id, shop_id: shopId, person_id: move.personId, ...set })
    .onConflict(['shop_id', 'person_id'])
    .merge({ ...set, revision: db.raw('conversations.revision + 1') });
}

const mostAutoReplies = 3;
const autoReplyWindow = 3_600_000;
const countRow = z.object({ auto_replies: z.number(), auto_replies_since: moment.nullable() });

/**
 * Counts one answer of the kind "I could not read that" to a phone.
 * @returns false when it has had as many within the hour as one may bear
 */
export async function countAutoReply(scope: ShopScope, personId: string, at: number): Promise<boolean> {
  const own = { shop_id: scope.shopId, person_id: personId };
  const found: unknown = await scope.db('conversations').where(own).first();
  if (!found) return true;
  const { auto_replies: count, auto_replies_since: since } = countRow.parse(found);
  const isFresh = since === null || at - since >= autoReplyWindow;
  if (!isFresh && count >= mostAutoReplies) return false;
  await scope
    .db('conversations')
    .where(own)
    .update(isFresh ? { auto_replies: 1, auto_replies_since: at } : { auto_replies: count + 1 });
  return true;
}
