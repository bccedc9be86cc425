/**
 * A phone number as people without the right to read it see it: enough to tell two apart, not enough to call.
 * @param phone a number in E.164 form
 * @returns the last three digits behind three dots; only the dots for anything shorter than seven digits
 */
export function maskPhone(phone: string): string {
  const digits = phone.replace(/\D/g, '');
  return digits.length < 7 ? '•••' : `••• ${digits.slice(-3)}`;
}
