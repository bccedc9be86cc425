import { describe, expect, it } from 'vitest';
import type { PersonRole } from './person.ts';
import { isWithinReach } from './reach.ts';

describe('whom somebody may change', () => {
  const cases: [PersonRole[], boolean][] = [
    [['operator'], true],
    [['supervisor'], false],
    [['operator', 'supervisor'], false],
    [['operator', 'admin'], false],
    // Nobody in particular: a person without a role is the admin's to mend.
    [[], false],
  ];
  it.each(cases)('who only invites operators, of %j: %s', (roles, expected) => {
    expect(isWithinReach({ roles }, 'operators')).toBe(expected);
    expect(isWithinReach({ roles }, 'everybody')).toBe(true);
  });
});
