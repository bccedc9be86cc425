import { describe, expect, it } from 'vitest';
import { readReservedWord, reservedWords } from './reserved-words.ts';

describe('reserved words', () => {
  it('reads each one in any case, with space or a stop behind it', () => {
    for (const meaning of ['stop', 'start', 'help'] as const) {
      for (const word of reservedWords[meaning]) {
        for (const typed of [word, word.toLowerCase(), ` ${word}\n`, `${word}.`, `${word}!`]) {
          expect(readReservedWord(typed), typed).toBe(meaning);
        }
      }
    }
    expect(readReservedWord('Stop all')).toBe('stop');
    expect(readReservedWord('opt-out')).toBe('stop');
  });

  it('does not hear one in a longer text or in another word', () => {
    for (const typed of [
      'stop the machine',
      'yes ok',
      'the end',
      'ending',
      'restart',
      'no',
      '',
      '41.5',
      'OK',
    ]) {
      expect(readReservedWord(typed), typed).toBeUndefined();
    }
  });
});
