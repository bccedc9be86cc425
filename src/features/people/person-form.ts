import type { Language } from '../../i18n/languages.ts';
import type { PersonKind, PersonRole } from './person.ts';
import type { PublicPerson } from './public-person.ts';
import { formatWallTime, parseWallTime, usualWorkSpans, type WorkSpan } from './work-hours.ts';

/** What the form holds: texts as typed, days as the checkboxes give them. */
export interface PersonFormValues {
  kind: PersonKind;
  name: string;
  roles: PersonRole[];
  phone: string;
  email: string;
  language: Language;
  plainLetters: 'plain' | 'marked';
  hours: { days: string[]; from: string; to: string }[];
  safetyPerson: boolean;
  invite: boolean;
}

const minutesInDay = 24 * 60;

function toHours(spans: readonly WorkSpan[]): PersonFormValues['hours'] {
  return spans.map(({ days, fromMinute, toMinute }) => ({
    days: days.map(String),
    from: formatWallTime(fromMinute),
    to: formatWallTime(toMinute % minutesInDay),
  }));
}

export function newPersonValues(language: Language): PersonFormValues {
  return {
    kind: 'person',
    name: '',
    roles: ['operator'],
    phone: '',
    email: '',
    language,
    plainLetters: 'plain',
    hours: toHours(usualWorkSpans),
    safetyPerson: false,
    invite: true,
  };
}

export function personValues(person: PublicPerson): PersonFormValues {
  return {
    kind: person.kind,
    name: person.name,
    roles: person.roles,
    phone: person.phone ?? '',
    email: person.email ?? '',
    language: person.language,
    plainLetters: person.plainLetters ? 'plain' : 'marked',
    hours: toHours(person.workSpans),
    safetyPerson: person.safetyPerson,
    invite: false,
  };
}

/** What was typed, as the endpoint asks for it. A time that is none stays out, and the schema names it. */
export function toPersonFields(values: PersonFormValues) {
  return {
    kind: values.kind,
    name: values.name,
    roles: values.kind === 'line phone' ? ['operator' as const] : values.roles,
    phone: values.phone,
    email: values.kind === 'line phone' ? '' : values.email,
    language: values.language,
    plainLetters: values.plainLetters === 'plain',
    safetyPerson: values.kind === 'person' && values.safetyPerson,
    workSpans: values.hours.map(({ days, from, to }) => ({
      days: days.map(Number),
      fromMinute: parseWallTime(from) ?? undefined,
      toMinute: parseWallTime(to) ?? undefined,
    })),
  };
}

/** Where in the form a refused field of the endpoint stands: `#/workSpans/0/fromMinute` is `hours.0.from`. */
export function formFieldOf(pointer: string): string {
  return pointer
    .replace(/^#\//, '')
    .replaceAll('/', '.')
    .replace(/^workSpans/, 'hours')
    .replace(/\.fromMinute$/, '.from')
    .replace(/\.toMinute$/, '.to')
    .replace(/\.days\.\d+$/, '.days');
}

const comparedFields = [
  'kind',
  'name',
  'roles',
  'phoneShown',
  'email',
  'language',
  'plainLetters',
  'workSpans',
  'safetyPerson',
] as const;
export type ComparedField = (typeof comparedFields)[number];

/** What somebody else changed between two states of a person. */
export function changedFields(before: PublicPerson, after: PublicPerson): ComparedField[] {
  return comparedFields.filter((field) => JSON.stringify(before[field]) !== JSON.stringify(after[field]));
}
