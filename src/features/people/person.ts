import type { Language } from '../../i18n/languages.ts';
import type { WorkSpan } from './work-hours.ts';

/** A line phone is a place: whoever is on shift answers it. */
export const personKinds = ['person', 'line phone'] as const;
export type PersonKind = (typeof personKinds)[number];

/** The same roles as in `server/auth/permissions.ts`, in the order in which people read them. */
export const personRoles = ['operator', 'supervisor', 'engineer', 'admin'] as const;
export type PersonRole = (typeof personRoles)[number];

export const consentStates = ['unasked', 'asked', 'agreed', 'opted out'] as const;
export type ConsentState = (typeof consentStates)[number];

/** Somebody of the shop, as the services know them. Moments are milliseconds UTC. */
export interface Person {
  id: string;
  kind: PersonKind;
  name: string;
  email: string | null;
  /** E.164. */
  phone: string | null;
  language: Language;
  plainLetters: boolean;
  workSpans: WorkSpan[];
  roles: PersonRole[];
  safetyPerson: boolean;
  consent: ConsentState;
  consentAt: number | null;
  consentWording: number | null;
  consentHow: string | null;
  askedBy: string | null;
  active: boolean;
  erasedAt: number | null;
  /** Whether they have set a password, and so have joined. */
  joined: boolean;
  revision: number;
  createdAt: number;
}

/** Operators come by link and text; every other role signs in with mail address and password. */
export function signsIn(roles: readonly PersonRole[]): boolean {
  return roles.some((role) => role !== 'operator');
}

/** Whether whoever may only invite operators may see and change this person. */
export function isOperatorOnly(person: { roles: readonly PersonRole[] }): boolean {
  return person.roles.length > 0 && !signsIn(person.roles);
}

export function sortRoles(held: readonly PersonRole[]): PersonRole[] {
  return personRoles.filter((role) => held.includes(role));
}

/** How a person can be invited: a mail to set a password, a text that asks for consent. */
export type InvitationWay = 'mail' | 'text';

/**
 * The ways that are open now. A number that said STOP is asked by nobody but its owner: they may text START.
 */
export function invitationWays(
  person: Pick<Person, 'active' | 'roles' | 'email' | 'joined' | 'phone' | 'consent'>,
): InvitationWay[] {
  if (!person.active) return [];
  const ways: InvitationWay[] = [];
  if (signsIn(person.roles) && person.email !== null && !person.joined) ways.push('mail');
  if (person.phone !== null && (person.consent === 'unasked' || person.consent === 'asked'))
    ways.push('text');
  return ways;
}
