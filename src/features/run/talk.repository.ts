import { z } from 'zod';
import { moment } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { messageStates } from '../message/message.ts';

const sentRow = z.object({
  person_id: z.string().nullable(),
  body: z.string(),
  state: z.enum(messageStates),
  created_at: moment,
  sent_at: moment.nullable(),
});

/** What was texted about a run, oldest first. */
export async function listTextsOfRun(scope: ShopScope, runId: string) {
  const rows = await scope
    .db('messages')
    .where({ shop_id: scope.shopId, run_id: runId, channel: 'text' })
    .orderBy('id')
    .select('person_id', 'body', 'state', 'created_at', 'sent_at');
  return z.array(sentRow).parse(rows);
}

const replyRow = z.object({ person_id: z.string().nullable(), body: z.string(), sent_at: moment });

/** What came back about a run, oldest first. */
export async function listRepliesToRun(scope: ShopScope, runId: string) {
  const rows = await scope
    .db('inbox_texts')
    .where({ shop_id: scope.shopId, run_id: runId })
    .orderBy(['sent_at', 'id'])
    .select('person_id', 'body', 'sent_at');
  return z.array(replyRow).parse(rows);
}

const stopRow = z.object({
  person_id: z.string(),
  state: z.enum(messageStates),
  dedupe: z.string(),
  created_at: moment,
});

/** The texts of the last stop of a trial, by who was told. */
export async function listStopTexts(scope: ShopScope, trialId: string) {
  const rows = z
    .array(stopRow)
    .parse(
      await scope
        .db('messages')
        .where({ shop_id: scope.shopId, trial_id: trialId, template: 'stopped' })
        .whereNotNull('person_id')
        .orderBy('id')
        .select('person_id', 'state', 'dedupe', 'created_at'),
    );
  // `stopped:<trial>:<stop>:<person>`: each stop has its own name.
  const stopOf = (dedupe: string) => dedupe.split(':')[2];
  const last = rows.at(-1);
  return last ? rows.filter(({ dedupe }) => stopOf(dedupe) === stopOf(last.dedupe)) : [];
}

/** When each of these people first texted after a moment. */
export async function listFirstReplies(
  scope: ShopScope,
  personIds: readonly string[],
  after: number,
): Promise<Map<string, number>> {
  const rows = z.array(z.object({ person_id: z.string(), at: moment })).parse(
    await scope
      .db('inbox_texts')
      .where({ shop_id: scope.shopId })
      .whereIn('person_id', [...personIds])
      .where('sent_at', '>', after)
      .groupBy('person_id')
      .select('person_id')
      .min({ at: 'sent_at' }),
  );
  return new Map(rows.map(({ person_id, at }) => [person_id, at]));
}

/** Tells one state of a trial's texts from the next, so that a board also follows how far they got. */
export async function stampOfTexts(scope: ShopScope, trialId: string): Promise<string> {
  const rows = z
    .array(z.object({ state: z.string(), count: moment }))
    .parse(
      await scope
        .db('messages')
        .where({ shop_id: scope.shopId, trial_id: trialId })
        .groupBy('state')
        .orderBy('state')
        .select('state')
        .count({ count: '*' }),
    );
  return rows.map(({ state, count }) => `${state.slice(0, 2)}${count}`).join('');
}
