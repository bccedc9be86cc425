import { z } from 'zod';
import { parseTypedNumber } from '../../i18n/format.ts';
import '../people/schema-settings.ts';
import type { ResultItem } from '../run/result-items.ts';
import type { Figure } from '../run/run.ts';

/** What a button of the page sends. Figures come in fields named `r<result>-<part>`. */
export const phoneActions = [
  'send',
  'made',
  'right',
  'cannot',
  'problem',
  'later',
  'skip',
  'danger',
] as const;

export const phoneFormSchema = z.object({
  action: z.enum(phoneActions),
  run: z.uuidv7().optional(),
  /** Made when the page was drawn, so that a second press of the same button does nothing. */
  submission: z.uuidv7(),
  words: z.string().trim().max(300).default(''),
});
export type PhoneForm = z.output<typeof phoneFormSchema>;

export const fieldName = (result: number, part: number) => `r${result}-${part}`;

/** The figures as typed, empty fields left out; a field that is no number is named. */
export function readTypedFigures(
  items: readonly ResultItem[],
  typed: Readonly<Record<string, string>>,
): { figures: Figure[]; faults: string[] } {
  const figures: Figure[] = [];
  const faults: string[] = [];
  for (const { result, parts, kind, lot } of items) {
    for (let part = 1; part <= parts; part += 1) {
      const name = fieldName(result, part);
      const text = typed[name]?.trim() ?? '';
      if (text === '') continue;
      const value = parseTypedNumber(text);
      if (value === null) faults.push(name);
      else if (kind === 'rejects') figures.push({ result, part, value: null, rejects: value, lot });
      else figures.push({ result, part, value, rejects: null, lot: null });
    }
  }
  return { figures, faults };
}
