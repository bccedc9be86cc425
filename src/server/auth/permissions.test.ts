import { describe, expect, it } from 'vitest';
import { byLink, permissions, roles, rolesMay } from './permissions.ts';

describe('permissions', () => {
  it('add up over roles', () => {
    expect(rolesMay(['engineer'], 'people.manage')).toBe(false);
    expect(rolesMay(['engineer', 'admin'], 'people.manage')).toBe(true);
  });

  it('give a signed-in operator nothing: operators come by a link', () => {
    expect(permissions.filter((permission) => rolesMay(['operator'], permission))).toEqual([]);
    expect(byLink.operator).toContain('trial.hold');
  });

  it('leave none without a role that has it', () => {
    expect(permissions.filter((permission) => !roles.some((role) => rolesMay([role], permission)))).toEqual(
      [],
    );
  });

  it('let nobody decide over a plan and write it by one role', () => {
    expect(rolesMay(['supervisor'], 'review.decide')).toBe(false);
    expect(rolesMay(['engineer'], 'trial.write')).toBe(false);
  });
});
