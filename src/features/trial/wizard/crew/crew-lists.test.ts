import { describe, expect, it } from 'vitest';
import type { CrewMember } from '../wizard-context.ts';
import { crewMembers, listCallees, listRunners } from './crew-lists.ts';

const person = (id: string, roles: string[], more: Partial<CrewMember> = {}): CrewMember => ({
  id,
  kind: 'person',
  name: id,
  language: 'en',
  roles,
  safetyPerson: false,
  consent: 'agreed',
  consentAt: 0,
  textingHours: ['Mon–Fri 06:00–14:00'],
  ...more,
});
const people = [
  person('robin', ['admin']),
  person('dana', ['supervisor']),
  person('sam', ['engineer'], { safetyPerson: true }),
  person('ana', ['operator']),
  person('phone', ['operator'], { kind: 'line phone' }),
];
const names = (list: readonly CrewMember[]) => list.map(({ id }) => id).join(' ');

describe('the people on the page of the crew', () => {
  it('stand in the order in which they are likely to be picked', () => {
    expect(names(listRunners(people))).toBe('ana phone robin dana sam');
    expect(names(listCallees(people))).toBe('sam dana robin ana');
  });

  it('are asked how they get the runs once each, and only if they run or measure', () => {
    const shifts = [
      { id: 'day', runs: 'ana', measures: 'phone', calls: 'dana' },
      { id: 'night', runs: 'ana' },
      { id: 'late', runs: 'gone' },
    ];
    expect(names(crewMembers(shifts, people))).toBe('ana phone');
  });
});
