/** What became of a press on the phone page, for the line at the top of the page that follows. */
export const phoneOutcomes = [
  'saved',
  'more',
  'odd',
  'made',
  'later',
  'skipped',
  'told',
  'asked',
  'stopped',
  'behind',
  'photo',
  'photoRefused',
  'photoEnough',
] as const;
export type PhoneOutcome = (typeof phoneOutcomes)[number];

export function isPhoneOutcome(text: string | null): text is PhoneOutcome {
  return phoneOutcomes.some((outcome) => outcome === text);
}
