import { expect, it } from 'vitest';
import { listConversations } from './conversations.ts';
import type { KeptText } from './kept-texts.ts';

function text(from: string, to: string, direction: KeptText['direction'], createdAt: number): KeptText {
  const rest = {
    ...({ status: 'delivered', errorCode: null, segments: 1, statusCallback: null } as const),
    media: [],
  };
  return { sid: `SM${createdAt}`, direction, from, to, body: 'x', createdAt, updatedAt: createdAt, ...rest };
}

it('keeps a phone in two shops apart, newest first, silent phones last', () => {
  const texts = [
    text('+1A', '+1P', 'outbound-api', 1),
    text('+1B', '+1P', 'outbound-api', 2),
    text('+1P', '+1A', 'inbound', 3),
  ];
  const phones = [
    { phone: '+1P', name: 'Ana' },
    { phone: '+1Q', name: 'Minh' },
  ];
  const found = listConversations(texts, phones, ['+1B']);
  expect(found.map(({ name, number, texts: own }) => [name, number, own.length])).toEqual([
    ['Ana', '+1A', 2],
    ['Ana', '+1B', 1],
    ['Minh', '+1B', 0],
  ]);
});
