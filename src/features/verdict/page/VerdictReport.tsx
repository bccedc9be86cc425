import { CanYouTrust } from './CanYouTrust.tsx';
import { HowMuchBetter } from './HowMuchBetter.tsx';
import { IfItGoesWrong } from './IfItGoesWrong.tsx';
import type { PageWording } from './page-wording.ts';
import { TellYourBoss } from './TellYourBoss.tsx';
import { TopSentence } from './TopSentence.tsx';
import { WhatToSet } from './WhatToSet.tsx';

/** The five answers alone, for one sheet of paper. */
export function VerdictReport(wording: PageWording) {
  const { view, t, formats } = wording;
  return (
    <article className="verdict verdict-report">
      <p className="verdict-report-head">
        <strong>{view.title}</strong>
        <span>
          {t('verdict-page:cardPage.note', {
            number: formats.number(view.number),
            date: formats.date(view.madeAt),
          })}
        </span>
      </p>
      <TopSentence {...wording} />
      <WhatToSet {...wording} />
      <HowMuchBetter {...wording} />
      <CanYouTrust {...wording} />
      <IfItGoesWrong {...wording} />
      <TellYourBoss {...wording} />
      <p className="verdict-report-foot">{t('verdict-page:cardPage.foot')}</p>
    </article>
  );
}
