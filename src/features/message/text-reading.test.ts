import { describe, expect, it } from 'vitest';
import type { Consent } from './send-guard.ts';
import { type ConversationState, readFirstMeaning } from './text-reading.ts';

function read(body: string, consent: Consent, conversation: ConversationState = 'idle') {
  return readFirstMeaning(body, {
    consent,
    isSuppressed: consent === 'opted out',
    conversation,
    language: 'pl',
  });
}

describe('what a text means before any run', () => {
  it('is the end of texts at any time', () => {
    for (const consent of ['unasked', 'asked', 'agreed', 'opted out'] as const) {
      expect(read('Stop.', consent)).toBe('optOut');
    }
  });

  it('is consent only as an answer to the question', () => {
    expect(read('OK', 'asked', 'asked')).toBe('agree');
    expect(read('Yes', 'asked', 'asked')).toBe('agree');
    expect(read('nie', 'asked', 'asked')).toBe('decline');
    expect(read('START', 'asked', 'asked')).toBe('other');
    for (const consent of ['unasked', 'agreed'] as const) expect(read('OK', consent)).toBe('other');
  });

  it('is leave to ask again, and no more, after an opt-out', () => {
    expect(read('START', 'opted out', 'left')).toBe('askAgain');
    expect(read('Yes', 'opted out', 'left')).toBe('askAgain');
    expect(read('OK', 'opted out', 'left')).toBe('other');
    expect(read('41.5', 'opted out', 'left')).toBe('other');
  });

  it('is leave to ask where somebody else opted out with the same number', () => {
    const person = {
      consent: 'unasked',
      isSuppressed: true,
      conversation: 'unasked',
      language: 'en',
    } as const;
    expect(readFirstMeaning('START', person)).toBe('askAgain');
    expect(readFirstMeaning('OK', person)).toBe('other');
  });

  it('is practice where one number was asked for', () => {
    expect(read('41,5', 'agreed', 'practice')).toBe('practiceDone');
    expect(read('what?', 'agreed', 'practice')).toBe('other');
    expect(read('41,5', 'agreed', 'idle')).toBe('other');
    expect(read('41,5', 'asked', 'asked')).toBe('other');
  });

  it('is left to the service where the service answers', () => {
    expect(read('help', 'agreed')).toBe('serviceAnswers');
  });
});
