import { listActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { MessageState } from '../message/message.ts';
import { readNames } from '../people/people.repository.ts';
import type { Board } from './board.schema.ts';
import { listFirstReplies, listStopTexts } from './talk.repository.ts';

type Stop = NonNullable<Board['stop']>;

/** How far a text about a stop got, as whoever must know says it. */
const wayOf: Record<MessageState, Stop['told'][number]['text']> = {
  waiting: 'on its way',
  sending: 'on its way',
  unsure: 'on its way',
  sent: 'sent',
  delivered: 'got',
  failed: 'failed',
  cancelled: 'failed',
};

/** When a trial was stopped, who was told, and who has answered since. */
export async function readStop(scope: ShopScope, trialId: string): Promise<Stop | null> {
  const lines = await listActivity(scope, { limit: 100, trialId });
  const held = lines.find(({ kind }) => kind === 'trial.held');
  if (!held) return null;
  const texts = (await listStopTexts(scope, trialId)).filter(
    ({ created_at }) => created_at >= held.at - 1_000,
  );
  const ids = texts.map(({ person_id }) => person_id);
  const names = await readNames(scope, ids);
  const replies = await listFirstReplies(scope, ids, held.at);
  return {
    at: held.at,
    told: texts.map(({ person_id, state }) => ({
      name: names.get(person_id) ?? '',
      text: wayOf[state],
      answeredAt: replies.get(person_id) ?? null,
    })),
  };
}
