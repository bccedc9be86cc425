import { EffectList } from '../../../components/ui/EffectList.tsx';
import { resultWords } from '../result-words.ts';
import type { PageWording } from './page-wording.ts';
import { whyRows } from './why-rows.ts';

/** Every change on one scale; better lies right, whatever better is here. */
export function WhyWeSaySo(wording: PageWording) {
  const { view, t } = wording;
  const { response } = view.brief;
  const { figure, size } = resultWords(wording);
  const rows = whyRows(wording);
  const target = response.goal === 'target' ? figure(response.target ?? 0, { manner: 'fine' }) : null;
  return (
    <section className="verdict-why" aria-labelledby="why-we-say-so">
      <h2 id="why-we-say-so">{t('verdict-page:part.why')}</h2>
      {rows.length === 0 ? (
        <p>{t('verdict-page:why.none')}</p>
      ) : (
        <EffectList
          rows={rows}
          worthHaving={response.worthHaving ?? 0}
          worseLabel={target === null ? t('verdict-page:why.worse') : t('verdict-page:why.away', { target })}
          betterLabel={
            target === null ? t('verdict-page:why.better') : t('verdict-page:why.toward', { target })
          }
          bandLabel={t('verdict-page:why.band', { worth: size(response.worthHaving ?? 0, null) })}
        />
      )}
    </section>
  );
}
