import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { moveConversation } from '../message/conversation.repository.ts';
import { type QueuedMessage, queueMessage } from '../message/message.service.ts';
import type { TemplateName, TemplateParams } from '../message/templates.ts';
import type { ConversationState } from '../message/text-reading.ts';
import { type Caller, findCaller } from './run-people.service.ts';
import type { RunningTrial } from './running-trial.ts';

/** What a text is about; `because` makes its purpose one of a kind: the text it answers, or the run's revision. */
export interface About {
  trialId?: string;
  runId?: string;
  because: string;
  urgent?: boolean;
  notBefore?: number;
}

/** Writes a text to a person in the transaction of what it tells of. */
export function tell<Name extends TemplateName>(
  scope: ShopScope,
  personId: string,
  text: { template: Name; params: TemplateParams<Name> },
  about: About,
): Promise<QueuedMessage> {
  const { because, ...rest } = about;
  return queueMessage(scope, {
    ...text,
    ...rest,
    personId,
    dedupe: `${text.template}:${because}:${personId}`,
  });
}

/** Tells whoever is called about the trial now. @returns who that is */
export async function tellCaller<Name extends TemplateName>(
  scope: ShopScope,
  trial: RunningTrial,
  text: { template: Name; params: TemplateParams<Name> },
  about: Omit<About, 'trialId'>,
): Promise<Caller> {
  const caller = await findCaller(scope, trial);
  if (caller.personId !== null) await tell(scope, caller.personId, text, { ...about, trialId: trial.id });
  return caller;
}

/** Moves the talk with a phone on. */
export function talkOf(
  scope: ShopScope,
  personId: string,
  state: ConversationState,
  about: { runId?: string | null; readingId?: string | null; promptMessageId?: string | null } = {},
): Promise<void> {
  return moveConversation(scope, { id: newId(), personId, state, ...about });
}
