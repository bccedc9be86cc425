import type { PageWording } from './page-wording.ts';

/** What was decided so far, newest first, without a name. */
export function Decisions({ view, t, formats }: PageWording) {
  if (view.decisions.length === 0) return null;
  return (
    <section className="verdict-list" aria-labelledby="decided">
      <h2 id="decided">{t('verdict-page:part.decided')}</h2>
      <ul className="verdict-lines">
        {view.decisions.map(({ outcome, note, at }) => (
          <li key={at}>
            <strong>{t(`verdict-page:outcome.${outcome}`)}</strong>
            {` · ${formats.dateTime(at)}`}
            {note !== '' && <span className="block">{note}</span>}
          </li>
        ))}
      </ul>
    </section>
  );
}
