import { sayFact } from '../verdict-words.ts';
import { factsOf, type PageWording } from './page-wording.ts';

function List({ id, title, words, empty }: { id: string; title: string; words: string[]; empty: string }) {
  return (
    <section className="verdict-list" aria-labelledby={id}>
      <h2 id={id}>{title}</h2>
      {words.length === 0 ? (
        <p>{empty}</p>
      ) : (
        <ul className="verdict-lines">
          {words.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
      )}
    </section>
  );
}

/** What this trial cannot tell, with what it would take to know of single settings. */
export function CannotTell(wording: PageWording) {
  const { view, t } = wording;
  const { verdict } = view;
  const ofSettings = factsOf(verdict.details, 'would-settle').filter(
    ({ refs }) => refs.terms?.[0]?.length === 1,
  );
  const facts = [
    ...factsOf(verdict.cannotTell, 'nothing-outside-range', 'cannot-be-told-apart', 'hidden-by-batches'),
    ...ofSettings,
    ...factsOf(verdict.watched, 'watched-moves'),
  ];
  return (
    <List
      id="cannot-tell"
      title={t('verdict-page:part.limits')}
      words={facts.map((fact) => sayFact(fact, wording))}
      empty={t('verdict-page:limits.none')}
    />
  );
}

/** Best first. After check runs their own next step leads. */
export function WhatNext(wording: PageWording) {
  const { view, t } = wording;
  const steps = view.confirmation
    ? view.verdict.next.filter((fact) => fact.kind !== 'check-runs')
    : view.verdict.next;
  return (
    <List
      id="what-next"
      title={t('verdict-page:part.next')}
      words={steps.map((fact) => sayFact(fact, wording))}
      empty={t('verdict-page:limits.none')}
    />
  );
}
