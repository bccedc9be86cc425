import { describe, expect, it } from 'vitest';
import { hashToken, keyedHash, newToken, sameSecret } from './token.ts';

describe('tokens', () => {
  it('carry 128 bits and never repeat', () => {
    const tokens = Array.from({ length: 1000 }, newToken);
    expect(new Set(tokens).size).toBe(1000);
    for (const token of tokens) expect(Buffer.from(token, 'base64url')).toHaveLength(16);
  });

  it('are stored as SHA-256 (FIPS 180-4, the example for "abc")', () => {
    expect(hashToken('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });

  it('have keyed hashes that differ by purpose', () => {
    expect(keyedHash('phone', '+1')).not.toBe(keyedHash('form', '+1'));
    expect(keyedHash('phone', '+1')).toBe(keyedHash('phone', '+1'));
  });

  it('are compared whole', () => {
    expect(sameSecret('abc', 'abc')).toBe(true);
    expect(sameSecret('abc', 'abd')).toBe(false);
    expect(sameSecret('abc', 'ab')).toBe(false);
  });
});
