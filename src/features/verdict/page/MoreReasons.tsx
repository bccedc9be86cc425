import type { ReactNode } from 'react';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { sayCallLine } from '../call-words.ts';
import { sayFact } from '../verdict-words.ts';
import { PairChart } from './PairChart.tsx';
import { factsOf, type PageWording } from './page-wording.ts';
import { otherPairs } from './why-rows.ts';

function Lines({ words }: { words: readonly string[] }) {
  return (
    <ul className="verdict-lines">
      {words.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}

function Together(wording: PageWording) {
  const { view, t } = wording;
  const isJudged = view.verdict.settings.length > 0;
  const corners = factsOf(view.verdict.details, 'pair-corners');
  const likeliest = factsOf(view.verdict.details, 'likeliest-of-tied');
  return (
    <>
      {corners.length === 0 && <p>{isJudged ? t('verdict-page:pair.none') : t('verdict-page:why.none')}</p>}
      {corners.map((fact) => (
        <PairChart key={fact.refs.terms?.join()} corners={fact} {...wording} />
      ))}
      <Lines words={likeliest.map((fact) => sayFact(fact, wording))} />
      <Lines words={otherPairs(wording).map((row) => sayCallLine(row, wording))} />
    </>
  );
}

/** What stands behind the calls, each part closed until somebody asks. */
export function MoreReasons(wording: PageWording) {
  const { view, t } = wording;
  const { verdict, brief } = view;
  const say = (facts: Parameters<typeof sayFact>[0][]) => facts.map((fact) => sayFact(fact, wording));
  const odd = say(factsOf(verdict.trust, 'odd-reading', 'other-scale-fits-better'));
  const steadier = say(verdict.steadier);
  const canSteady = brief.response.kind === 'measured' && (brief.response.partsPerRun ?? 1) >= 5;
  const middle = say(
    factsOf(verdict.trust, 'no-bend-in-sum', 'bends', 'bend-not-settled', 'bend-not-looked-at'),
  );
  const time = say([
    ...factsOf(verdict.trust, 'drift-seen', 'no-drift-seen', 'drift-not-judged'),
    ...factsOf(verdict.cannotTell, 'hidden-by-batches', 'short-term-spread'),
  ]);
  const parts: [string, ReactNode][] = [
    [t('verdict-page:part.together'), <Together key="together" {...wording} />],
    [t('verdict-page:part.middle'), <Lines key="middle" words={middle} />],
    [t('verdict-page:part.time'), <Lines key="time" words={time} />],
    [
      t('verdict-page:part.odd'),
      <Lines key="odd" words={odd.length > 0 ? odd : [t('verdict-page:odd.none')]} />,
    ],
    [
      t('verdict-page:part.steady'),
      <Lines
        key="steady"
        words={
          steadier.length > 0
            ? steadier
            : [canSteady ? t('verdict-page:steady.none') : t('verdict-page:steady.unseen')]
        }
      />,
    ],
  ];
  return (
    <div className="verdict-more">
      {parts.map(([title, inside]) => (
        <Disclosure key={title} summary={title}>
          {inside}
        </Disclosure>
      ))}
    </div>
  );
}
