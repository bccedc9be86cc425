import { type CountryCode, parsePhoneNumberFromString } from 'libphonenumber-js';

/**
 * A phone number as people write it, checked and in E.164 form.
 * @param typed with a country's code, or in the way of the country of `shopNumber`
 * @param shopNumber the number the shop's texts come from, in E.164 form
 * @returns null where it is no number that can be texted: too short, not given out, an extension behind it
 */
export function parsePhone(typed: string, shopNumber: string | null): string | null {
  const country = shopNumber === null ? undefined : countryOfPhone(shopNumber);
  const options = country === undefined ? { extract: false } : { defaultCountry: country, extract: false };
  const parsed = parsePhoneNumberFromString(typed.trim(), options);
  if (!parsed?.isValid() || parsed.ext !== undefined) return null;
  return parsed.number;
}

/** The country a number belongs to, where its digits say so. */
export function countryOfPhone(phone: string): CountryCode | undefined {
  return parsePhoneNumberFromString(phone)?.country;
}
