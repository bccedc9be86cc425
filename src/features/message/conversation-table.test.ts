import { describe, expect, it } from 'vitest';
import { replyIntents } from '../../lib/messages/index.ts';
import { conversationActions, conversationTable } from './conversation-table.ts';
import { conversationStates } from './text-reading.ts';

describe('the talk with one phone', () => {
  it.each(conversationStates)('has an answer to everything while it is %s', (state) => {
    expect(Object.keys(conversationTable[state]).sort()).toEqual([...replyIntents].sort());
    for (const intent of replyIntents)
      expect(conversationActions).toContain(conversationTable[state][intent]);
  });

  it('holds the trial on danger and ends texts on stop, whatever was said before', () => {
    for (const state of conversationStates) {
      expect(conversationTable[state].danger).toBe('hold');
      expect(conversationTable[state].stop).toBe('optOut');
    }
  });

  it('takes nothing but that from somebody who has not agreed', () => {
    for (const state of ['unasked', 'asked', 'left'] as const) {
      const taken = replyIntents.filter((intent) => conversationTable[state][intent] !== 'setAside');
      const expected =
        state === 'asked' ? ['danger', 'no', 'start', 'stop', 'yes'] : ['danger', 'start', 'stop'];
      expect(taken.sort()).toEqual(expected);
    }
  });

  it('uses every action', () => {
    const used = new Set(conversationStates.flatMap((state) => Object.values(conversationTable[state])));
    expect([...used].sort()).toEqual([...conversationActions].sort());
  });
});
