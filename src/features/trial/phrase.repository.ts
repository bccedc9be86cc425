import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import { now } from '../../server/clock.ts';
import { jsonColumn } from '../../server/db/columns.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';

export const phrasePurposes = ['stop rule', 'caution', 'what to make'] as const;
export type PhrasePurpose = (typeof phrasePurposes)[number];

const textsSchema = z.object({ v: z.literal(1), texts: z.partialRecord(z.enum(languages), z.string()) });
const phraseRow = z.object({ id: z.string(), texts: jsonColumn(textsSchema) });
export type PhraseTexts = z.output<typeof textsSchema>['texts'];

/** The shop's own words for a purpose, newest first: the same words once in each language. */
export async function listPhrases(
  scope: ShopScope,
  purpose: PhrasePurpose,
): Promise<{ id: string; texts: PhraseTexts }[]> {
  const rows = await scope
    .db('phrases')
    .where({ shop_id: scope.shopId, purpose })
    .orderBy('id', 'desc')
    .limit(50)
    .select('id', 'texts');
  return z
    .array(phraseRow)
    .parse(rows)
    .map(({ id, texts }) => ({ id, texts: texts.texts }));
}

/** Keeps words for the next trial, with who wrote them; words that are there already stay as they are. */
export async function keepPhrase(
  scope: ShopScope,
  phrase: { purpose: PhrasePurpose; texts: PhraseTexts; hash: string; writtenBy: string },
): Promise<void> {
  await scope
    .db('phrases')
    .insert({
      id: newId(),
      shop_id: scope.shopId,
      purpose: phrase.purpose,
      texts: JSON.stringify({ v: 1, texts: phrase.texts }),
      hash: phrase.hash,
      written_by: phrase.writtenBy,
      created_at: now(),
    })
    .onConflict(['shop_id', 'purpose', 'hash'])
    .ignore();
}
