import type { ConsentState } from './person.ts';

/** The wording of the consent question now in use. A new wording gets a new number; stored consent keeps the one it was given under. */
export const consentWording = 1;

/** How somebody was asked or answered. */
export const consentWays = ['text', 'phone page', 'paper', 'set back'] as const;
export type ConsentWay = (typeof consentWays)[number];

/** What the activity log says about a person's consent, in the order in which it usually happens. */
export const consentEvents = [
  'consent.asked',
  'consent.agreed',
  'consent.declined',
  'consent.withdrawn',
  'consent.reopened',
  'consent.lapsed',
] as const;
export type ConsentEvent = (typeof consentEvents)[number];

/** From which states an event leads on, and where to. Anything else changes nothing. */
export const consentSteps: Readonly<
  Record<ConsentEvent, { from: readonly ConsentState[]; to: ConsentState }>
> = {
  'consent.asked': { from: ['unasked', 'asked'], to: 'asked' },
  'consent.agreed': { from: ['asked'], to: 'agreed' },
  'consent.declined': { from: ['asked'], to: 'unasked' },
  // STOP counts at once, whatever was said before.
  'consent.withdrawn': { from: ['unasked', 'asked', 'agreed'], to: 'opted out' },
  // START lets a question through again. It is no yes to it.
  'consent.reopened': { from: ['opted out'], to: 'unasked' },
  'consent.lapsed': { from: ['asked', 'agreed', 'opted out'], to: 'unasked' },
};

/** Whether the product may send this person anything but the consent question. */
export function mayBeTexted(person: {
  active: boolean;
  phone: string | null;
  consent: ConsentState;
}): boolean {
  return person.active && person.phone !== null && person.consent === 'agreed';
}
