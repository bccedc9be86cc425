import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { maskPhone } from '../../lib/messages/index.ts';
import { consentStates, invitationWays, type Person, personKinds, personRoles } from './person.ts';
import './schema-settings.ts';
import { workSpansSchema } from './work-hours.ts';

/** A person as the API and the islands see one: no hash, no password, the number only for those who may read it. */
export const publicPersonSchema = z.object({
  id: z.string(),
  kind: z.enum(personKinds),
  name: z.string(),
  email: z.string().nullable(),
  /** Null without a number, and for readers who may not see it: `phoneShown` then has its last digits. */
  phone: z.string().nullable(),
  phoneShown: z.string().nullable(),
  language: z.enum(languages),
  plainLetters: z.boolean(),
  roles: z.array(z.enum(personRoles)),
  workSpans: workSpansSchema,
  safetyPerson: z.boolean(),
  consent: z.enum(consentStates),
  consentAt: z.number().nullable(),
  active: z.boolean(),
  erased: z.boolean(),
  joined: z.boolean(),
  invitationWays: z.array(z.enum(['mail', 'text'])),
  revision: z.number(),
});
export type PublicPerson = z.output<typeof publicPersonSchema>;

export function toPublicPerson(person: Person, reader: { seesPhones: boolean }): PublicPerson {
  const { phone } = person;
  return {
    id: person.id,
    kind: person.kind,
    name: person.name,
    email: person.email,
    phone: reader.seesPhones ? phone : null,
    phoneShown: phone === null ? null : reader.seesPhones ? phone : maskPhone(phone),
    language: person.language,
    plainLetters: person.plainLetters,
    roles: person.roles,
    workSpans: person.workSpans,
    safetyPerson: person.safetyPerson,
    consent: person.consent,
    consentAt: person.consentAt,
    active: person.active,
    erased: person.erasedAt !== null,
    joined: person.joined,
    invitationWays: invitationWays(person),
    revision: person.revision,
  };
}
