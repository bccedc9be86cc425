import { useTranslation } from 'react-i18next';
import { ButtonLink } from '../../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import { trialAddress } from '../../trial-address.ts';
import { takesAnswers } from '../../trial-states.ts';
import { useWizard, type WizardShop } from '../wizard-context.ts';
import { useStanding } from './standing.tsx';

const mostNames = 2;

/** Who may look at the plan, by name while they are few. */
function checkersOf({ people }: WizardShop, readerId: string): string[] {
  const names = people
    .filter(({ id, roles, safetyPerson }) => id !== readerId && (roles.includes('engineer') || safetyPerson))
    .map(({ name }) => name);
  return names.length <= mostNames ? names : [];
}

/** Where the plan is: with the engineer, sent back, agreed to, started, or checked by nobody else. */
export function StandingCallout() {
  const { t, i18n } = useTranslation('wizard-safety');
  const { shop } = useWizard();
  const { now, readerId } = useStanding();
  const { review, state, secondPerson } = now;
  const language = i18n.language as Language;
  const { dateTime } = formatsFor(language, shop.timeZone);
  const decided = { who: review?.decidedBy ?? '', time: dateTime(review?.decidedAt ?? 0) };

  if (state === 'plan review' && review) {
    const checkers = checkersOf(shop, readerId);
    const list = new Intl.ListFormat(language, { type: 'disjunction' }).format(checkers);
    const who = checkers.length > 0 ? list : t('start.theEngineer');
    return (
      <Callout
        tone="info"
        live="polite"
        title={t('start.waitingTitle', { who, time: dateTime(review.askedAt) })}
        actions={<a href={`/trials/${now.trialId}/review`}>{t('start.openReview')}</a>}
      >
        {t('start.waitingWords')} {t('start.sendFixed')}
      </Callout>
    );
  }
  if (!takesAnswers(state)) {
    return (
      <Callout
        tone="good"
        live="polite"
        title={t('start.startedTitle')}
        actions={
          <ButtonLink href={trialAddress({ id: now.trialId, state })} iconEnd="arrow-right">
            {t('start.openBoard')}
          </ButtonLink>
        }
      >
        {t('start.startedWords')}
      </Callout>
    );
  }
  if (review?.state === 'sent back') {
    return (
      <Callout tone="caution" live="polite" title={t('start.sentBackTitle', decided)}>
        {t('start.sentBackWords')}
      </Callout>
    );
  }
  if (review?.state === 'approved' && review.holds) {
    return (
      <Callout tone="good" live="polite" title={t('start.approvedTitle', decided)}>
        {t('start.approvedWords')}
      </Callout>
    );
  }
  if (secondPerson === 'missing') {
    return (
      <Callout tone="caution" title={t('start.nobodyTitle')}>
        {t('start.nobodyWords')}
      </Callout>
    );
  }
  if (secondPerson !== 'alone') return null;
  return (
    <Callout tone="caution" title={t('start.uncheckedTitle')}>
      {t('start.uncheckedWords')}
    </Callout>
  );
}
