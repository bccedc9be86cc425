import type { CheckFinding, CheckReason, CheckStep } from './texts-check.schema.ts';

/** What is known of the text that a check sent. Moments in milliseconds UTC. */
export interface CheckedText {
  state: 'waiting' | 'sending' | 'unsure' | 'sent' | 'delivered' | 'failed' | 'cancelled';
  createdAt: number;
  notBefore: number;
  sentAt: number | null;
  providerStatus: 'accepted' | 'sent' | 'delivered' | 'undelivered' | null;
  errorCode: string | null;
}

/** When a text came in from the phone after the check began, and whether a webhook brought it. */
export interface CheckAnswer {
  receivedAt: number;
  sentAt: number;
}

const patience = { sending: 30_000, report: 60_000, answer: 120_000 };
/** The catch-up looks every two minutes; what a webhook brings is here within seconds. */
const webhookAtMost = 15_000;

const good: CheckFinding = { state: 'good', why: null };
const waiting = (why: CheckReason | null = null): CheckFinding => ({ state: 'waiting', why });
const bad = (why: CheckReason): CheckFinding => ({ state: 'bad', why });

function judgeSent(text: CheckedText, now: number): CheckFinding {
  if (text.state === 'sent' || text.state === 'delivered') return good;
  if (text.state === 'failed' || text.state === 'cancelled') {
    return text.providerStatus === 'undelivered' ? good : bad('refused');
  }
  if (text.notBefore > now) return waiting('hours');
  return now - Math.max(text.createdAt, text.notBefore) > patience.sending ? bad('worker') : waiting();
}

function judgeDelivered(text: CheckedText, sent: CheckFinding, now: number): CheckFinding {
  if (text.state === 'delivered') return good;
  if (text.providerStatus === 'undelivered') return bad('undelivered');
  if (sent.state !== 'good' || text.sentAt === null) return waiting();
  return now - text.sentAt > patience.report ? bad('noReport') : waiting();
}

function judgeAnswered(
  delivered: CheckFinding,
  answer: CheckAnswer | null,
  text: CheckedText,
  now: number,
): CheckFinding {
  if (answer) return good;
  if (delivered.state !== 'good' || text.sentAt === null) return waiting();
  return now - text.sentAt > patience.answer ? bad('noAnswer') : waiting('answerNow');
}

/**
 * Whether the signature has been shown to fit. Only signed calls are let in, so a report that came, or an answer that
 * came as fast as only a webhook brings it, shows it.
 */
function judgeSignature(
  text: CheckedText,
  answer: CheckAnswer | null,
  delivered: CheckFinding,
): CheckFinding {
  const reported = text.state === 'delivered' || text.providerStatus === 'undelivered';
  const broughtByWebhook = answer !== null && answer.receivedAt - answer.sentAt <= webhookAtMost;
  if (reported || broughtByWebhook) return good;
  return delivered.state === 'bad' ? bad('noReport') : waiting('proof');
}

/** How far a check has got: for each step a tick, a wait or what is wrong. Before the first check all wait. */
export function judgeCheck(
  text: CheckedText | null,
  answer: CheckAnswer | null,
  now: number,
): Record<CheckStep, CheckFinding> {
  if (!text)
    return { sent: waiting(), delivered: waiting(), answered: waiting(), signature: waiting('proof') };
  const sent = judgeSent(text, now);
  const delivered = judgeDelivered(text, sent, now);
  return {
    sent,
    delivered,
    answered: judgeAnswered(delivered, answer, text, now),
    signature: judgeSignature(text, answer, delivered),
  };
}
