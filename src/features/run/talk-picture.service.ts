import type { InboxText } from '../message/inbox.repository.ts';
import { listClosedRunsOf } from './runs-in-hand.repository.ts';
import type { Talk, TalkResult } from './talk.service.ts';
import { answerUnread } from './talk-unread.service.ts';
import { tell } from './tell.service.ts';

export function hasPictures({ media }: InboxText): boolean {
  return media.items.length + media.unlisted > 0;
}

/** A picture without a word belongs to the run in hand, else to the one that closed last in this person's hands. */
export async function takePicture(talk: Talk): Promise<TalkResult> {
  const { scope, person, text, focus, inHand } = talk;
  const run = focus ?? inHand[0] ?? (await listClosedRunsOf(scope, person.personId))[0];
  if (run === undefined) return answerUnread(talk);
  const about = { trialId: run.trialId, runId: run.id, because: text.id };
  await tell(scope, person.personId, { template: 'photoNoted', params: { run: run.number } }, about);
  return { runId: run.id, isUsed: true };
}
