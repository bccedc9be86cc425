import { z } from 'zod';
import { type Language, languages } from '../../i18n/languages.ts';
import { type PersonRole, personKinds, personRoles, signsIn, sortRoles } from './person.ts';
import './schema-settings.ts';
import { workSpansSchema } from './work-hours.ts';

/** An empty field is no answer, not an empty one. */
function emptyAsNull<Output>(schema: z.ZodType<Output>) {
  return z.preprocess((typed) => (typeof typed === 'string' && typed.trim() === '' ? null : typed), schema);
}

const controlCharacters = /\p{Cc}|[\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;

export const personNameSchema = z
  .string()
  .trim()
  .min(1)
  .max(80)
  .refine((name) => !controlCharacters.test(name), { error: 'does-not-fit' });

/** The parts of a person that a form asks for. The phone is checked on the server, which knows every country's numbers. */
export const personFieldSchemas = {
  kind: z.enum(personKinds),
  name: personNameSchema,
  email: emptyAsNull(z.string().trim().toLowerCase().max(254).pipe(z.email()).nullable()),
  phone: emptyAsNull(z.string().trim().max(40).nullable()),
  language: z.enum(languages),
  plainLetters: z.boolean(),
  roles: z.array(z.enum(personRoles)).min(1).max(personRoles.length).transform(sortRoles),
  safetyPerson: z.boolean(),
  workSpans: workSpansSchema,
};

export interface PersonFields {
  kind: (typeof personKinds)[number];
  name: string;
  email: string | null;
  phone: string | null;
  language: Language;
  plainLetters: boolean;
  roles: PersonRole[];
  safetyPerson: boolean;
  workSpans: z.output<typeof workSpansSchema>;
}

export interface PersonFault {
  field: 'email' | 'phone' | 'roles';
  code: 'mail-needed' | 'line-phone-needs-number' | 'line-phone-only-operator';
}

/** What is wrong with the answers as a whole, each of which may be right by itself. */
export function personFaults(
  person: Pick<PersonFields, 'kind' | 'email' | 'phone' | 'roles'>,
): PersonFault[] {
  if (person.kind === 'line phone') {
    const faults: PersonFault[] = [];
    if (person.phone === null) faults.push({ field: 'phone', code: 'line-phone-needs-number' });
    if (signsIn(person.roles)) faults.push({ field: 'roles', code: 'line-phone-only-operator' });
    return faults;
  }
  return signsIn(person.roles) && person.email === null ? [{ field: 'email', code: 'mail-needed' }] : [];
}

function refuseFaults(person: PersonFields, context: z.RefinementCtx): void {
  for (const { field, code } of personFaults(person)) {
    context.addIssue({ code: 'custom', path: [field], message: code, input: person[field] });
  }
}

/** A whole person as the form holds it. */
export const personFormSchema = z.strictObject(personFieldSchemas).superRefine(refuseFaults);

/** POST /api/people. The id may be the client's own, so that sending it twice adds nobody twice. */
export const addPersonSchema = z
  .strictObject({
    ...personFieldSchemas,
    id: z.uuidv7().optional(),
    /** Whether to invite at once, by every way that is open. */
    invite: z.boolean().default(false),
  })
  .superRefine(refuseFaults);
export type AddPerson = z.output<typeof addPersonSchema>;

/** PATCH /api/people/:id. What is left out stays as it is. */
export const changePersonSchema = z
  .strictObject(personFieldSchemas)
  .partial()
  .extend({ revision: z.number().int().positive() });
export type ChangePerson = z.output<typeof changePersonSchema>;

/** The body of every action on a person: the state the reader saw. */
export const personRevisionSchema = z.strictObject({ revision: z.number().int().positive() });

export const personParamsSchema = z.object({ id: z.string() });
