import type { AdviceFact } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { sentences, type Wording } from './wording.ts';

type Bend<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

/** The core's bend is the corners' mean less the middle's: above zero the middle lies lower. */
function sayBend({ values }: Bend<'bends'>, wording: Wording): string {
  const { t } = wording;
  const { size, spec } = resultWords(wording);
  const way = values.bend > 0 ? 'lower' : 'higher';
  const amount = size(values.bend, values.interval);
  return sentences([
    t(`verdict:trust.bend.${way}`, { amount }),
    sayWhere(wording, way, spec.goal, values.settings),
  ]);
}

function sayWhere(
  { t }: Wording,
  way: 'lower' | 'higher',
  goal: 'more' | 'less' | 'target',
  settings: number,
) {
  if (settings > 1) return t('verdict:trust.bend.whose');
  if (goal === 'target') return null;
  return (way === 'higher') === (goal === 'more')
    ? t('verdict:trust.bend.between')
    : t('verdict:trust.bend.atEnd');
}

export const bendSayings = {
  'no-bend-in-sum': (_: Bend<'no-bend-in-sum'>, { t, view }: Wording) =>
    t('verdict:trust.bend.none', {
      count: view.brief.factors.filter(({ kind }) => kind === 'number').length,
    }),
  bends: sayBend,
  'bend-not-settled': (_: Bend<'bend-not-settled'>, { t }: Wording) => t('verdict:trust.bend.open'),
  'bend-not-looked-at': (_: Bend<'bend-not-looked-at'>, { t }: Wording) => t('verdict:trust.bend.unseen'),
};
