import type { AdviceFact } from '../../lib/doe/index.ts';
import { changeName, listTerms } from './setting-words.ts';
import type { Wording } from './wording.ts';

type Limit<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

function sayRanges(wording: Wording): string {
  const ranges = wording.view.brief.factors.flatMap((factor, place) =>
    factor.kind === 'number' ? [changeName(wording, String.fromCharCode(65 + place))] : [],
  );
  return wording.t('verdict:limit.outside', { settings: wording.formats.list(ranges) });
}

/** What this trial cannot tell. */
export const limitSayings = {
  'nothing-outside-range': (_: Limit<'nothing-outside-range'>, wording: Wording) => sayRanges(wording),
  'cannot-be-told-apart': ({ refs }: Limit<'cannot-be-told-apart'>, wording: Wording) =>
    wording.t('verdict:limit.apart', { terms: listTerms(wording, refs.terms ?? []) }),
  'hidden-by-batches': ({ refs }: Limit<'hidden-by-batches'>, wording: Wording) =>
    wording.t('verdict:limit.batches', { terms: listTerms(wording, refs.terms ?? []) }),
  'short-term-spread': ({ values }: Limit<'short-term-spread'>, { t }: Wording) =>
    t('verdict:limit.shortTerm', { count: Math.round(values.parts) }),
};
