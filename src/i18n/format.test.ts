import { describe, expect, it } from 'vitest';
import { formatsFor, parseTypedNumber } from './format.ts';

const noonOnTheDayOfChange = Date.UTC(2026, 2, 8, 16, 0);

describe('formatsFor', () => {
  it('writes numbers as the reader does', () => {
    expect(formatsFor('en', 'UTC').number(1234.5)).toBe('1,234.5');
    expect(formatsFor('pl', 'UTC').number(12345.5)).toBe('12\u00a0345,5');
    expect(formatsFor('vi', 'UTC').number(1234.5)).toBe('1.234,5');
    expect(formatsFor('es', 'UTC').number(0.25, 1)).toBe('0,3');
  });

  it('writes the wall time of the shop, on both sides of the change of clock', () => {
    const { time } = formatsFor('en', 'America/New_York');
    expect(time(noonOnTheDayOfChange)).toBe('12:00');
    expect(time(noonOnTheDayOfChange - 24 * 3_600_000)).toBe('11:00');
  });

  it('writes money from minor units', () => {
    expect(formatsFor('en', 'UTC').money(14_000, 'USD')).toBe('$140.00');
    expect(formatsFor('vi', 'UTC').money(350_000, 'VND')).toBe('350.000\u00a0₫');
  });

  it('joins lists with the right word', () => {
    expect(formatsFor('pl', 'UTC').list(['a', 'b', 'c'])).toBe('a, b i c');
  });
});

describe('parseTypedNumber', () => {
  it.each([
    ['41.5', 41.5],
    ['41,5', 41.5],
    [' -0,8 ', -0.8],
    ['\u22123', -3],
    ['+7', 7],
    ['.5', 0.5],
  ])('reads %j', (text, value) => {
    expect(parseTypedNumber(text)).toBe(value);
  });

  it.each(['', '1,234,5', '1.2.3', '41.5 N', '1e3', 'NaN', '--1', '５'])('does not guess at %j', (text) => {
    expect(parseTypedNumber(text)).toBeNull();
  });
});
