import type { PageWording } from './page-wording.ts';

/**
 * Bad parts and money saved in a week. Only rejects say how many parts are bad; of anything measured nobody knows how many parts miss the limit today.
 */
export function moneyWords({ view, t, formats }: PageWording): string | null {
  const { partsPerWeek, costOfBadPart, currency } = view.value;
  const { response } = view.brief;
  if (response.kind !== 'rejects' || response.goal !== 'less' || partsPerWeek === null) return null;
  const fewer = -view.bet.versusUsual * partsPerWeek;
  if (!(fewer >= 1)) return null;
  // Two figures are as much as a forecast carries.
  const step = 10 ** Math.max(0, Math.floor(Math.log10(fewer)) - 1);
  const rounded = Math.round(fewer / step) * step;
  const words = { parts: formats.number(partsPerWeek), fewer: formats.number(rounded) };
  return costOfBadPart === null
    ? t('verdict-page:better.fewer', words)
    : t('verdict-page:better.money', {
        ...words,
        money: formats.roughMoney(rounded * costOfBadPart, currency),
      });
}
