import { z } from 'zod';

/** Usually E.164, but short codes and names may write too, and nothing that came in is lost. */
const phone = z.string().min(1).max(64);
const count = z.coerce.number().int().min(0).max(10).catch(0);

/** A text that came in, as the text service's webhook tells it. Fields that we do not name are left unread. */
export const inboundWebhookSchema = z
  .looseObject({
    MessageSid: z.string().min(1).max(64),
    From: phone,
    To: phone,
    Body: z.string().default(''),
    NumMedia: count.default(0),
  })
  .transform((form) => ({
    providerId: form.MessageSid,
    from: form.From,
    to: form.To,
    body: form.Body,
    media: { items: listMedia(form, form.NumMedia), unlisted: 0 },
  }));

function listMedia(form: Record<string, unknown>, media: number): { url: string; type: string }[] {
  return Array.from({ length: media }, (_, place) => ({
    url: String(form[`MediaUrl${place}`] ?? ''),
    type: String(form[`MediaContentType${place}`] ?? ''),
  })).filter(({ url }) => url !== '');
}

/** News of a text that went out. */
export const statusWebhookSchema = z
  .looseObject({
    MessageSid: z.string().min(1).max(64),
    From: phone,
    MessageStatus: z.string(),
    ErrorCode: z.string().optional(),
  })
  .transform((form) => ({
    from: form.From,
    report: { providerId: form.MessageSid, status: form.MessageStatus, errorCode: form.ErrorCode },
  }));
