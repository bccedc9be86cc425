import { Disclosure } from '../../components/ui/Disclosure.tsx';
import type { PageWording } from '../verdict/page/page-wording.ts';
import { auditAddress } from './frame/audit-parts.ts';
import { statementsOf } from './statements.ts';

/** For those who may read the audit: every statement of the verdict with the way to the figures it rests on. */
export function StatementFigures(wording: PageWording) {
  const { view, t } = wording;
  return (
    <div className="no-print">
      <Disclosure summary={t('audit-review:behind')}>
        <ul className="audit-lines">
          {statementsOf(wording).map(({ place, words, href }) => (
            <li key={place}>
              {words}{' '}
              <a href={href}>
                {t('audit-review:figures')}
                <span className="sr-only">: {words}</span>
              </a>
            </li>
          ))}
        </ul>
        <p>
          <a href={auditAddress(view.trialId, 'model')}>{t('audit-review:whole')}</a>
        </p>
      </Disclosure>
    </div>
  );
}
