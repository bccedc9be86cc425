import type { NamedPhone } from '../settings.ts';
import { type KeptText, numberOf, phoneOf } from './kept-texts.ts';

/** All texts between one phone and one shop's number, oldest first. */
export interface PhoneConversation {
  phone: string;
  number: string;
  /** The name the demo gave the phone, or the number itself. */
  name: string;
  texts: KeptText[];
}

/**
 * Conversations, the one with the newest text first; phones that the demo named but that have no text yet come last.
 * @param numbers the shops' numbers; a named phone without texts is offered the first one
 */
export function listConversations(
  texts: readonly KeptText[],
  phones: readonly NamedPhone[],
  numbers: readonly string[],
): PhoneConversation[] {
  const nameOf = new Map(phones.map(({ phone, name }) => [phone, name]));
  const found = new Map<string, PhoneConversation>();
  for (const text of texts) {
    const phone = phoneOf(text);
    const number = numberOf(text);
    const key = `${phone} ${number}`;
    // Set anew each time: a map keeps the order of first insertion, and the newest is to come last.
    const conversation = found.get(key) ?? { phone, number, name: nameOf.get(phone) ?? phone, texts: [] };
    conversation.texts.push(text);
    found.delete(key);
    found.set(key, conversation);
  }
  const [firstNumber] = numbers;
  const silent = phones
    .filter(({ phone }) => ![...found.values()].some((one) => one.phone === phone))
    .flatMap(({ phone, name }) =>
      firstNumber === undefined ? [] : [{ phone, number: firstNumber, name, texts: [] }],
    );
  return [...[...found.values()].reverse(), ...silent];
}
