import { expect, it } from 'vitest';
import { maskPhone } from './mask-phone.ts';

it('shows three digits of a phone number and nothing of its length', () => {
  expect(maskPhone('+15550100123')).toBe('••• 123');
  expect(maskPhone('+48 601 000 456')).toBe('••• 456');
  expect(maskPhone('12345')).toBe('•••');
  expect(maskPhone('')).toBe('•••');
});
