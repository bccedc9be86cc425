import { randomUUID } from 'node:crypto';
import PostalMime, { type Address } from 'postal-mime';
import { z } from 'zod';
import { openKeptDocument } from '../kept-document.ts';

export const keptMailSchema = z.object({
  id: z.string(),
  receivedAt: z.number(),
  /** The envelope: who really gets it, whatever the headers say. */
  recipients: z.array(z.string()),
  from: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  messageId: z.string(),
});
export type KeptMail = z.output<typeof keptMailSchema>;

/** Mails, oldest first. */
export interface Mailbox {
  readonly mails: readonly KeptMail[];
  add(raw: Buffer, recipients: string[], at: number): Promise<void>;
  close(): void;
}

export function openMailbox(file: string | undefined): Mailbox {
  const kept = openKeptDocument({
    file,
    schema: z.object({ mails: z.array(keptMailSchema) }),
    empty: { mails: [] },
  });
  return {
    mails: kept.content.mails,
    add: async (raw, recipients, at) => {
      const mail = await PostalMime.parse(raw);
      kept.content.mails.push({
        id: randomUUID(),
        receivedAt: at,
        recipients,
        from: mail.from === undefined ? '' : writeAddress(mail.from),
        to: (mail.to ?? []).map(writeAddress).join(', '),
        subject: mail.subject ?? '',
        text: (mail.text ?? mail.html ?? '').trimEnd(),
        messageId: mail.messageId ?? '',
      });
      kept.changed();
    },
    close: kept.close,
  };
}

function writeAddress(address: Address): string {
  if (address.address === undefined) return address.name;
  return address.name === '' ? address.address : `${address.name} <${address.address}>`;
}
