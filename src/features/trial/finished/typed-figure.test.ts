import { describe, expect, it } from 'vitest';
import { parseFigure, parseFigures } from './typed-figure.ts';

describe('typed figures', () => {
  it.each([
    ['35', 35],
    [' 3,5 N ', 3.5],
    ['160°C', 160],
    ['41.5 N per 15 mm', 41.5],
    ['41,5 N/15 mm', 41.5],
    ['5 m2', 5],
    ['12 %', 12],
    ['−2 °C', -2],
    ['.8 s', 0.8],
    ['$140', 140],
    ['30-40', null],
    ['30 to 40', null],
    ['30 C to 40 C', null],
    ['1.2.3', null],
    ['about 5', null],
    ['', null],
  ])('%j is %j', (typed, figure) => {
    expect(parseFigure(typed)).toBe(figure);
  });

  it.each([
    ['34,5\n36\r\n37,5\n', [34.5, 36, 37.5]],
    ['31\t35\t39', [31, 35, 39]],
    ['31, 35.5, 39', [31, 35.5, 39]],
    ['31,35,39', [31, 35, 39]],
    ['31; 35,5; 39', [31, 35.5, 39]],
    ['  ', []],
    ['31 about 39', null],
  ])('the list %j is %j', (typed, figures) => {
    expect(parseFigures(typed)).toEqual(figures);
  });
});
