import { createTransport } from 'nodemailer';
import { z } from 'zod';
import { isNeverReached, type SendOutcome } from './send-outcome.ts';

export interface OutgoingMail {
  /** Our own id: the Message-ID header is made of it, so a second copy can be told by any mail program. */
  messageId: string;
  to: { name: string; address: string };
  subject: string;
  text: string;
}

/** The service that carries mails, as the product sees it. */
export interface MailGateway {
  /** Hands one mail over, once. Never throws for the server's failures. */
  send(mail: OutgoingMail): Promise<SendOutcome>;
  close(): void;
}

export interface MailGatewaySettings {
  host: string;
  port: number;
  /** TLS from the first byte; otherwise STARTTLS where the server offers it. */
  secure: boolean;
  /** Refuses to speak in the clear. Off only for a server on this machine. */
  requireTls: boolean;
  user?: string | undefined;
  password?: string | undefined;
  from: { name: string; address: string };
  timeoutMilliseconds?: number;
}

const defaultTimeoutMilliseconds = 10_000;

/** Mail over SMTP. */
export function createMailGateway(settings: MailGatewaySettings): MailGateway {
  const { host, port, secure, requireTls, user, password, from } = settings;
  const timeout = settings.timeoutMilliseconds ?? defaultTimeoutMilliseconds;
  const transport = createTransport({
    host,
    port,
    secure,
    requireTLS: requireTls,
    ...(user === undefined ? {} : { auth: { user, pass: password ?? '' } }),
    connectionTimeout: timeout,
    greetingTimeout: timeout,
    // Longer than the greeting may take: which of the two clocks runs out tells whether a mail was on its way.
    socketTimeout: timeout * 2,
    // A mail is made of what is handed over; it never pulls in a file or an address.
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const domain = from.address.slice(from.address.lastIndexOf('@') + 1);
  return {
    send: async ({ messageId, to, subject, text }) => {
      if (!isMailAddress(to.address)) return { outcome: 'refused', code: 'address' };
      try {
        const sent = await transport.sendMail({
          from: { name: toHeaderText(from.name), address: from.address },
          to: { name: toHeaderText(to.name), address: to.address },
          subject: toHeaderText(subject),
          text,
          messageId: `<${messageId}@${domain}>`,
          headers: { 'Auto-Submitted': 'auto-generated' },
        });
        return { outcome: 'accepted', providerId: sent.messageId, status: 'sent' };
      } catch (error) {
        return readMailError(error);
      }
    },
    close: () => transport.close(),
  };
}

/** One line for a header: whatever would end it or start another becomes a space. */
export function toHeaderText(text: string): string {
  return text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' ').trim();
}

/** One address and nothing else: no second one behind a comma, no name, no control characters. */
function isMailAddress(address: string): boolean {
  return /^[^\s,;:<>()[\]"\\\p{Cc}]+@[^\s,;:<>()[\]"\\\p{Cc}@]+$/u.test(address);
}

const mailErrorSchema = z.object({
  code: z.string().optional(),
  originalCode: z.string().optional(),
  responseCode: z.number().optional(),
  timeoutType: z.string().optional(),
});

/** Steps before the mail itself is spoken of: what fails here has certainly not been sent. */
const earlyCodes = new Set(['EDNS', 'ETLS', 'EREQUIRETLS', 'EAUTH', 'ENOAUTH', 'ECONFIG', 'EPROXY']);
const earlyTimeouts = new Set(['CONNECT_TIMEOUT', 'GREETING_TIMEOUT', 'UPGRADE_TIMEOUT']);

/**
 * Reads a failed attempt. A 5yz reply is final (RFC 5321, 4.2.1), unless it is about us (sign-in) or about the order of
 * commands; a 4yz reply asks to come back; a line that broke in the middle leaves it open.
 */
export function readMailError(error: unknown): Exclude<SendOutcome, { outcome: 'accepted' }> {
  const parsed = mailErrorSchema.safeParse(error);
  if (!parsed.success) return { outcome: 'unsure', code: 'unknown' };
  const { code = 'unknown', originalCode, responseCode, timeoutType } = parsed.data;
  if (earlyCodes.has(code) || isNeverReached(originalCode ?? code)) return { outcome: 'retryLater', code };
  if (responseCode !== undefined) {
    const isFinal = responseCode >= 500 && responseCode !== 503;
    return { outcome: isFinal ? 'refused' : 'retryLater', code: String(responseCode) };
  }
  if (timeoutType !== undefined && earlyTimeouts.has(timeoutType)) return { outcome: 'retryLater', code };
  // No recipient is left, or the mail could not be put together: no later attempt will differ.
  if (code === 'EENVELOPE' || code === 'EMESSAGE') return { outcome: 'refused', code };
  return { outcome: 'unsure', code };
}
