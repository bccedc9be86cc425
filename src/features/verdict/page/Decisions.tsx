import type { PageWording } from './page-wording.ts';

const outcomes = ['adopt', 'adopt unchecked', 'not now', "keep today's", 'opened again'] as const;

function isOutcome(text: string): text is (typeof outcomes)[number] {
  return outcomes.some((known) => known === text);
}

/** What was decided so far, newest first, without a name. */
export function Decisions({ view, t, formats }: PageWording) {
  if (view.decisions.length === 0) return null;
  return (
    <section className="verdict-list" aria-labelledby="decided">
      <h2 id="decided">{t('verdict-page:part.decided')}</h2>
      <ul className="verdict-lines">
        {view.decisions.map(({ outcome, note, at }) => (
          <li key={at}>
            <strong>{isOutcome(outcome) ? t(`verdict-page:outcome.${outcome}`) : outcome}</strong>
            {` · ${formats.dateTime(at)}`}
            {note !== '' && <span className="block">{note}</span>}
          </li>
        ))}
      </ul>
    </section>
  );
}
