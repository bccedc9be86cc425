import { describe, expect, it } from 'vitest';
import { networkOf } from './network.ts';

describe('networkOf', () => {
  it.each([
    ['203.0.113.7', '203.0.113.7'],
    ['::ffff:203.0.113.7', '203.0.113.7'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2::'],
    ['2001:DB8:1:2::9', '2001:db8:1:2::'],
    ['2001:0db8:0001:0002::', '2001:db8:1:2::'],
    ['2001:db8::1', '2001:db8:0:0::'],
    ['::1', '0:0:0:0::'],
  ])('counts %s as %s', (address, network) => {
    expect(networkOf(address)).toBe(network);
  });
});
