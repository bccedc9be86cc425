import type { Language } from '../../i18n/languages.ts';
import type { RunPrompt } from './run-prompt.ts';
import { writeMessage } from './write-message.ts';

/** Segments a run prompt may take: two in plain letters, three in marked Vietnamese. */
export const promptSegments = { plain: 2, marked: 3 } as const;

export type PromptLength =
  | { fits: true }
  /** The longest name of the text, and how many letters of it must go at least. */
  | { fits: false; name: string; letters: number };

/**
 * Whether a run prompt fits its segments in one reader's language; if not, which name to shorten. Values are never the
 * answer: a cut value would be a wrong dial.
 */
export function measurePrompt(
  prompt: RunPrompt,
  reader: { language: Language; plainLetters: boolean },
): PromptLength {
  const most = reader.plainLetters ? promptSegments.plain : promptSegments.marked;
  const segmentsOf = (params: RunPrompt) =>
    writeMessage({ template: 'runPrompt', params, ...reader }).segments ?? 0;
  if (segmentsOf(prompt) <= most) return { fits: true };
  const { settings, machine, label, ask } = prompt;
  const names = [...settings.map(({ name }) => name), machine, label, ask.name];
  const name = names.reduce((longest, next) => (next.length > longest.length ? next : longest));
  let letters = 1;
  while (letters < name.length - 1 && segmentsOf(shorten(prompt, name, letters)) > most) letters += 1;
  return { fits: false, name, letters };
}

function shorten(prompt: RunPrompt, name: string, letters: number): RunPrompt {
  const cut = (text: string) => (text === name ? text.slice(0, text.length - letters) : text);
  const { settings, machine, label, ask } = prompt;
  return {
    ...prompt,
    machine: cut(machine),
    label: cut(label),
    settings: settings.map((setting) => ({ ...setting, name: cut(setting.name) })),
    ask: { ...ask, name: cut(ask.name) },
  };
}
