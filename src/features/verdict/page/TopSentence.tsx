import type { ReactNode } from 'react';
import { Callout } from '../../../components/ui/Callout.tsx';
import { listDials, movedPlaces } from '../headline-words.ts';
import { sayFact } from '../verdict-words.ts';
import { keepsToday, type PageWording } from './page-wording.ts';

interface Props extends PageWording {
  /** Where the engineer's word stands, for those inside. */
  readonly signOff?: ReactNode;
}

/** One or two sentences: after check runs what they said, before them what the trial said. */
export function sayTop(wording: PageWording): string {
  const { verdict, confirmation } = wording.view;
  return sayFact(confirmation?.facts[0] ?? verdict.headline, wording);
}

/** Where the sentence tells what went wrong, the best that is known all the same. */
function sayBest(wording: PageWording): string | null {
  const { view, t } = wording;
  const isAside = ['some-runs-failed', 'trial-spoilt', 'limits-clash'].includes(view.verdict.headline.kind);
  if (!isAside || view.confirmation || keepsToday(view)) return null;
  return t('verdict-page:set.best', {
    settings: listDials(wording, view.bet.actual, movedPlaces(view), 'at'),
  });
}

export function TopSentence({ signOff, ...wording }: Props) {
  const { view, t, formats } = wording;
  const best = sayBest(wording);
  const made = view.runs.filter(({ end }) => end !== 'notRun').length;
  return (
    <div className="verdict-top">
      <p className="text-steel">
        {t('verdict-page:about', {
          count: view.plannedRuns,
          machine: view.machine,
          date: formats.date(view.madeAt),
        })}
      </p>
      <h1>{sayTop(wording)}</h1>
      {best && <p className="verdict-best">{best}</p>}
      {view.endedEarly && (
        <p>{t('verdict:headline.endedEarly', { count: made, planned: view.plannedRuns })}</p>
      )}
      {!view.isLatest && (
        <Callout
          tone="caution"
          title={t('verdict-page:newer.title', { n: formats.number(view.n) })}
          actions={<a href={`/trials/${view.trialId}/verdict`}>{t('verdict-page:newer.link')}</a>}
        />
      )}
      {signOff ??
        (view.reviewDue && (
          <Callout tone="caution" title={t('verdict-page:review.title')}>
            {t('verdict-page:review.words')}
          </Callout>
        ))}
    </div>
  );
}
