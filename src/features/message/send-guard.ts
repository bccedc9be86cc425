import type { FailureCode } from './message.ts';
import type { Template } from './templates.ts';
import { nextTextingMoment, type TextingHours } from './texting-hours.ts';

export type Consent = 'unasked' | 'asked' | 'agreed' | 'opted out';

/** The person a message is for, as far as sending depends on it. */
export interface Addressee {
  phone: string | null;
  email: string | null;
  consent: Consent;
  active: boolean;
  /** Whether this number opted out of the shop's texts, by this person or one before. */
  isSuppressed: boolean;
  hours: TextingHours;
  /** When the person last sent us a text, in milliseconds UTC. */
  lastTextedAt: number | null;
}

export type SendDecision =
  | { decision: 'send' }
  | { decision: 'wait'; until: number }
  | { decision: 'fail'; code: FailureCode };

/** How long after a person's own text an answer to it may go out whatever the hour. */
const answerMilliseconds = 10 * 60_000;

/**
 * Decides at the last moment whether a message may go out: consent, number and hours may have changed since it was
 * written.
 * @param message.recipient the number or address it was written for
 * @param now milliseconds UTC
 */
export function decideSending(
  message: { template: Template; recipient: string; urgent: boolean },
  person: Addressee | null,
  now: number,
): SendDecision {
  const { template, recipient, urgent } = message;
  // Somebody who is not one of our people: a mail to a former address.
  if (person === null) return template.channel === 'mail' ? { decision: 'send' } : fail('no-consent');
  if (template.channel === 'mail') return { decision: 'send' };

  if (!person.active) return fail('not-active');
  if (person.phone !== recipient) return fail('address-changed');
  if (person.isSuppressed || person.consent === 'opted out') return fail('opted-out');
  const wanted = template.audience === 'asked' ? 'asked' : 'agreed';
  if (template.audience !== 'anyone' && person.consent !== wanted) return fail('no-consent');

  if (urgent || isAnswer(template, person, now)) return { decision: 'send' };
  const until = nextTextingMoment(person.hours, now);
  if (until === null) return fail('no-hours');
  return until <= now ? { decision: 'send' } : { decision: 'wait', until };
}

function fail(code: FailureCode): SendDecision {
  return { decision: 'fail', code };
}

function isAnswer(template: Template, person: Addressee, now: number): boolean {
  return (
    template.answersText &&
    person.lastTextedAt !== null &&
    Math.abs(now - person.lastTextedAt) <= answerMilliseconds
  );
}
