import { z } from 'zod';
import { rolesMay } from '../../server/auth/permissions.ts';
import { listActivity } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { MessageState } from '../message/message.ts';
import { readNames } from '../people/people.repository.ts';
import type { TrialReader } from '../trial/trial-reader.service.ts';
import type { Board } from './board.schema.ts';
import { listFirstReplies, listStopTexts } from './talk.repository.ts';

type Stop = NonNullable<Board['stop']>;

const heldDetails = z.object({ unreached: z.array(z.string()).default([]) });

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

/** Who may see a number to call after a stop for safety: admins, and whoever runs trials. */
export function mayReadPhones(reader: TrialReader): boolean {
  return rolesMay(reader.roles, 'phone.read') || rolesMay(reader.roles, 'trial.run');
}

/** When a trial was stopped, who was told, and who has answered since. */
export async function readStop(scope: ShopScope, trialId: string, reader: TrialReader): Promise<Stop | null> {
  const lines = await listActivity(scope, { limit: 100, trialId });
  const mayCall = mayReadPhones(reader);
  const held = lines.find(({ kind }) => kind === 'trial.held');
  if (!held) return null;
  const texts = (await listStopTexts(scope, trialId)).filter(
    ({ created_at }) => created_at >= held.at - 1_000,
  );
  const { unreached } = heldDetails.parse(JSON.parse(held.details));
  const ids = [...texts.map(({ person_id }) => person_id), ...unreached];
  const names = await readNames(scope, ids);
  const replies = await listFirstReplies(scope, ids, held.at);
  return {
    at: held.at,
    told: [
      ...texts.map(({ person_id, state }) => ({ id: person_id, text: wayOf[state] })),
      ...unreached.map((id) => ({ id, text: 'no phone' as const })),
    ].map(({ id, text }) => ({
      ...{ personId: id, name: names.get(id) ?? '', text },
      answeredAt: replies.get(id) ?? null,
      mayCall: mayCall && text !== 'no phone',
    })),
  };
}
