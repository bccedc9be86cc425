/** What is wrong with one cell, or with a row as a whole. */
export const importFaultCodes = [
  'quotes',
  'too-many-cells',
  'no-name',
  'bad-name',
  'bad-phone',
  'bad-mail',
  'bad-language',
  'bad-role',
  'bad-days',
  'bad-time',
  'half-hours',
  'mail-needed',
  'phone-needed',
  'same-phone',
  'same-mail',
  'phone-here',
  'mail-here',
] as const;
export type ImportFaultCode = (typeof importFaultCodes)[number];

export interface ImportFault {
  line: number;
  code: ImportFaultCode;
  /** The cell as it was written, cut to what fits in a list. */
  text: string;
  /** The earlier line that has the same number or address. */
  otherLine?: number;
}
