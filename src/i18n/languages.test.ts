import { describe, expect, it } from 'vitest';
import { preferredLanguage } from './languages.ts';

describe('preferredLanguage', () => {
  it.each([
    ['pl-PL,pl;q=0.9,en;q=0.8', 'pl'],
    ['de-DE,de;q=0.9,vi;q=0.5,en;q=0.3', 'vi'],
    ['en;q=0.2,es-MX;q=0.7', 'es'],
    ['pl;q=0,es', 'es'],
    ['de', 'en'],
    ['', 'en'],
    [null, 'en'],
    [';;;q=,,', 'en'],
  ])('reads %j as %s', (header, language) => {
    expect(preferredLanguage(header)).toBe(language);
  });
});
