import { describe, expect, it } from 'vitest';
import { parsePhone } from './phone.ts';

const american = '+12025550100';

describe('a typed phone number', () => {
  it.each([
    ['+1 (202) 555-0142', american, '+12025550142'],
    ['202-555-0142', american, '+12025550142'],
    ['601 234 567', '+48221234567', '+48601234567'],
    ['0048 601 234 567', '+48221234567', '+48601234567'],
    ['  +84 91 234 5678 ', null, '+84912345678'],
  ])('%s is understood', (typed, shopNumber, expected) => {
    expect(parsePhone(typed, shopNumber)).toBe(expected);
  });

  it.each([
    // Long enough to look like E.164, yet nobody's number.
    ['+4812', american],
    ['+1 555', american],
    ['202-555-0142', null],
    ['+1 202 555 0142 ext 5', american],
    ['+12025550142, +12025550155', american],
    ['call Ana +12025550142', american],
    ['=1+1', american],
    ['', american],
  ])('%s is refused', (typed, shopNumber) => {
    expect(parsePhone(typed, shopNumber)).toBeNull();
  });
});
