import { expect, it } from 'vitest';
import { readReservedWord, reservedWords } from '../../lib/messages/index.ts';
import { decideCarrierAction } from './carrier-words.ts';

it('acts on the same words as the product reads', () => {
  const actions = { stop: 'opt out', start: 'opt in', help: 'help' } as const;
  for (const meaning of ['stop', 'start', 'help'] as const) {
    for (const word of reservedWords[meaning]) {
      expect(decideCarrierAction(` ${word.toLowerCase()} `, true), word).toBe(actions[meaning]);
    }
  }
});

it('hears nothing in a longer text, and a start word only from who had opted out', () => {
  expect(decideCarrierAction('stop the machine', false)).toBe('none');
  expect(decideCarrierAction('YES', false)).toBe('none');
  // The product is kinder than the carrier: it honours what the carrier does not see.
  expect(decideCarrierAction('Stop!', false)).toBe('none');
  expect(readReservedWord('Stop!')).toBe('stop');
});
