import { z } from 'zod';
import { scopeOfTextNumber } from '../../server/auth/text-number.ts';
import { now } from '../../server/clock.ts';
import { database } from '../../server/db/connection.ts';
import { config } from '../../server/env.ts';
import { AppError } from '../../server/errors.ts';
import { readSignedForm } from '../../server/http/signed-form.ts';
import { wakeWorker } from '../../server/wake.ts';
import { recordReport } from './delivery.service.ts';
import { keepReceivedText } from './inbox.service.ts';
import { inboundWebhookSchema, statusWebhookSchema } from './webhook.schema.ts';
import { isSignedWebhook } from './webhook-signature.ts';

/**
 * The form of a webhook that really comes from the text service.
 * @throws AppError `bad-signature`
 */
async function readWebhook<Output>(request: Request, schema: z.ZodType<Output>): Promise<Output> {
  const { appUrl, texts } = config();
  const form = await readSignedForm(request, appUrl);
  if (!isSignedWebhook({ authToken: texts.authToken, ...form })) throw new AppError('bad-signature');
  const parsed = schema.safeParse(form.parameters);
  if (!parsed.success) throw new AppError('malformed', { detail: z.prettifyError(parsed.error) });
  return parsed.data;
}

/** A text came in: kept, once, for the worker to read. A text to a number of no shop is none of ours. */
export async function takeInboundWebhook(request: Request): Promise<void> {
  const { to, ...text } = await readWebhook(request, inboundWebhookSchema);
  const scope = await scopeOfTextNumber(database(), to);
  if (scope === null) return;
  const isNew = await keepReceivedText(scope, { ...text, sentAt: now() });
  if (isNew) wakeWorker();
}

/**
 * News of a text that went out.
 * @param messageId our own id out of the address, since the news may arrive before the service's first answer is stored
 */
export async function takeStatusWebhook(request: Request, messageId: string | null): Promise<void> {
  const { from, report } = await readWebhook(request, statusWebhookSchema);
  const scope = await scopeOfTextNumber(database(), from);
  if (scope === null || messageId === null) return;
  await recordReport(scope, messageId, report);
}
