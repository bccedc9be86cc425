import { describe, expect, it } from 'vitest';
import { findPasswordFault } from './password-rule.ts';

const owner = { email: 'dana.whitlock@harrowlane.example', shopName: 'Harrow Lane Foods' };

describe('findPasswordFault', () => {
  it.each([
    ['eleven char', 'too-short'],
    ['x'.repeat(201), 'too-long'],
    ['Password 1234', 'too-common'],
    ['1Q2W3E4R5T6Y', 'too-common'],
    ['aaaaaaaaaaaaaa', 'too-plain'],
    ['121212121212', 'too-plain'],
    ['bcdefghijklmn', 'too-plain'],
    ['Harrow Lane Foods', 'too-close'],
    ['harrowlanefoods2026!', 'too-close'],
    ['dana.whitlock@harrowlane.example', 'too-close'],
    ['Dana-Whitlock-1', 'too-close'],
  ])('refuses %s as %s', (password, fault) => {
    expect(findPasswordFault(password, owner)).toBe(fault);
  });

  it.each([
    'the seals open on mondays',
    'łąka za halą nr 3',
    'mật khẩu của tôi đây',
    'harrow lane makes good soup',
    '🔥🧯🔥🧯 line three 🔥🧯',
  ])('takes %s', (password) => {
    expect(findPasswordFault(password, owner)).toBeNull();
  });

  it('counts letters as people do, not code units', () => {
    expect(findPasswordFault('🔥🧯🚪🪟🧰🔧', owner)).toBe('too-short');
  });

  it('lets a short mailbox name stand in a longer password', () => {
    expect(findPasswordFault('123456-al-7890', { email: 'al@x.example', shopName: 'X' })).toBeNull();
  });
});
