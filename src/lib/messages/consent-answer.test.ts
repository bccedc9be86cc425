import { describe, expect, it } from 'vitest';
import { readConsentAnswer } from './consent-answer.ts';

describe('the answer to the consent question', () => {
  it.each([
    'OK',
    'ok.',
    'Okay',
    'O.K.',
    'Yes',
    'Sí',
    'si',
    'Vale',
    'Tak',
    'zgoda!',
    'Okej',
    'Đồng ý',
    'dong y',
    'Được',
    'Vâng',
    'có',
  ])('hears yes in %s, whatever the language', (typed) => {
    for (const language of ['en', 'es', 'pl', 'vi'] as const) {
      expect(readConsentAnswer(typed, language)).toBe('yes');
    }
  });

  it.each(['No', 'nie', 'Không', 'khong', 'No, gracias'])('hears no in %s', (typed) => {
    expect(readConsentAnswer(typed, 'pl')).toBe('no');
  });

  it('takes an unmarked word that two languages share only from who speaks it', () => {
    expect(readConsentAnswer('co', 'vi')).toBe('yes');
    expect(readConsentAnswer('Co?', 'pl')).toBeUndefined();
    expect(readConsentAnswer('da', 'en')).toBeUndefined();
  });

  it('guesses nothing out of a sentence, a number or a carrier word', () => {
    for (const typed of ['ok but not at night', 'who is this', '41.5', '', 'START', 'okra', 'not ok']) {
      expect(readConsentAnswer(typed, 'en'), typed).toBeUndefined();
    }
  });
});
