import type { Translate } from '../../i18n/translator.ts';

interface ShopTab {
  href: string;
  label: string;
  current: boolean;
}

/** The pages about the shop. */
export function shopTabs(path: string, t: Translate): ShopTab[] {
  const places = [
    { href: '/shop', label: t('shop:links.rules') },
    { href: '/shop/texts-check', label: t('shop:links.textsCheck') },
    { href: '/shop/poster', label: t('shop:links.poster') },
  ];
  return places.map((place) => ({ ...place, current: place.href === path }));
}
