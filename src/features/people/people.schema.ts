import { z } from 'zod';
import './schema-settings.ts';

export const peopleShown = ['active', 'not asked', 'not active'] as const;
export const peopleSorts = ['name', 'added', 'consent', 'language'] as const;

/** GET /api/people. A page's `next` continues exactly where it ended, whoever was added or renamed in between. */
export const listPeopleSchema = z.strictObject({
  search: z.string().trim().max(80).default(''),
  show: z.enum(peopleShown).default('active'),
  sort: z.enum(peopleSorts).default('name'),
  direction: z.enum(['ascending', 'descending']).default('ascending'),
  after: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
export type ListPeople = z.output<typeof listPeopleSchema>;
