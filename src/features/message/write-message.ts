import type { Language } from '../../i18n/languages.ts';
import { translatorFor } from '../../i18n/translator.ts';
import { countSegments, toPlainLetters } from '../../lib/messages/index.ts';
import { type TemplateName, templates } from './templates.ts';

export interface WrittenMessage {
  subject: string | null;
  body: string;
  /** Segments of a text; null for a mail. */
  segments: number | null;
}

/**
 * Writes a message in a reader's language.
 * @param plainLetters texts in the seven-bit alphabet, three times as long for the same money
 * @throws ZodError when the parameters are not the template's own
 */
export function writeMessage(options: {
  template: TemplateName;
  params: unknown;
  language: Language;
  plainLetters: boolean;
}): WrittenMessage {
  const { template, params, language, plainLetters } = options;
  const { channel, write } = templates[template];
  const { subject, body } = write(translatorFor(language), params);
  if (channel === 'mail') return { subject: subject ?? '', body, segments: null };
  const letters = plainLetters ? toPlainLetters(body, language) : body.normalize('NFC');
  return { subject: null, body: letters, segments: countSegments(letters).segments };
}
