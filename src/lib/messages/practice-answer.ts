/**
 * Reads the answer to the practice text, which asks for one number and keeps none.
 * @returns true when the text is one number with a decimal point or comma, a unit of letters allowed after it
 */
export function isPracticeNumber(text: string): boolean {
  return /^\s*[+-]?\d+(?:[.,]\d+)?\s*\p{L}{0,6}\.?\s*$/u.test(text);
}
