import { isLanguage, type Language } from '../../i18n/languages.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { readCrewLanguages } from '../people/people.repository.ts';
import { findShop } from './shop.repository.ts';

/** What the poster needs: the languages that are read here, the shop's own first, and the number texts come from. */
export async function readPoster(
  scope: ShopScope,
): Promise<{ languages: Language[]; sender: string | null }> {
  const shop = await findShop(scope);
  const crew = (await readCrewLanguages(scope)).filter(isLanguage).sort();
  return { languages: [...new Set([shop.language, ...crew])], sender: shop.textNumber };
}
