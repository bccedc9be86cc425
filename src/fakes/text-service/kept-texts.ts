import { z } from 'zod';

/** A text as the service keeps it. Times in milliseconds UTC; `from` and `to` in E.164 form. */
export const keptTextSchema = z.object({
  sid: z.string(),
  direction: z.enum(['outbound-api', 'outbound-reply', 'inbound']),
  from: z.string(),
  to: z.string(),
  body: z.string(),
  status: z.enum(['queued', 'sent', 'delivered', 'undelivered', 'received']),
  errorCode: z.number().int().nullable(),
  segments: z.number().int(),
  /** Pictures that came along; what is in them lives only as long as the process. */
  media: z.array(z.object({ sid: z.string(), type: z.string() })).default([]),
  createdAt: z.number(),
  updatedAt: z.number(),
  statusCallback: z.string().nullable(),
});
export type KeptText = z.output<typeof keptTextSchema>;

/** One call of a webhook: what it said and how it ended. A missed one stays, to be looked at or delivered by hand. */
export const deliverySchema = z.object({
  number: z.number().int(),
  kind: z.enum(['inbound', 'status']),
  url: z.string(),
  parameters: z.record(z.string(), z.string()),
  at: z.number(),
  outcome: z.enum(['under way', 'taken', 'refused', 'missed']),
  httpStatus: z.number().int().nullable(),
});
export type Delivery = z.output<typeof deliverySchema>;

export const textServiceStateSchema = z.object({
  texts: z.array(keptTextSchema),
  /** `<service number> <phone>` of whoever opted out. */
  optedOut: z.array(z.string()),
  deliveries: z.array(deliverySchema),
});
export type TextServiceState = z.output<typeof textServiceStateSchema>;

export function emptyTextServiceState(): TextServiceState {
  return { texts: [], optedOut: [], deliveries: [] };
}

/** The operator's phone of a text, whoever sent it. */
export function phoneOf(text: KeptText): string {
  return text.direction === 'inbound' ? text.from : text.to;
}

/** The shop's number of a text, whoever sent it. */
export function numberOf(text: KeptText): string {
  return text.direction === 'inbound' ? text.to : text.from;
}
