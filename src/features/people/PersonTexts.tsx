import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { ConsentMark } from './ConsentMark.tsx';
import { FaultCallout } from './FaultCallout.tsx';
import { invitePersonCall } from './people.queries.ts';
import type { ConsentStep } from './person-page.schema.ts';
import type { PersonPart } from './person-part.ts';

interface Props extends PersonPart<ReactNode> {
  readonly history: readonly ConsentStep[];
  readonly language: Language;
  readonly timeZone: string;
}

/** Whether this person may be texted, how that came about, and the question and invitation that are open. */
export function PersonTexts({ person, history, language, timeZone, onChange, say }: Props) {
  const { t } = useTranslation('people');
  const { busy, fault, submit } = useSubmission();
  const formats = formatsFor(language, timeZone);
  const [first, second] = person.invitationWays;

  const invite = () =>
    submit(async () => {
      const { person: invited, ways } = await invitePersonCall(person.id);
      onChange(invited);
      const sent = ways.length > 1 ? 'sentBoth' : ways.includes('mail') ? 'sentMail' : 'sentText';
      say('good', t(`invite.${sent}`));
    });
  const asksAgain = first === 'text' && person.consent === 'asked';
  const label = second ? 'both' : asksAgain ? 'again' : first;

  return (
    <section className="sheet grid gap-4" aria-labelledby="texts-title">
      <h2 id="texts-title">{t('texts.title')}</h2>
      <div>
        <p className="font-semibold">
          <ConsentMark person={person} />
        </p>
        <p>{person.phoneShown === null ? t('texts.none') : t(`texts.${person.consent}`)}</p>
        {person.invitationWays.includes('mail') && <p className="mt-2">{t('invite.mailWords')}</p>}
      </div>
      <FaultCallout fault={fault} />
      {label && (
        <div className="button-row">
          <Button icon="send" busy={busy} busyLabel={t('form.saving')} onClick={invite}>
            {t(`invite.${label}`)}
          </Button>
        </div>
      )}
      {history.length > 0 && (
        <div>
          <h3 className="mb-2">{t('texts.history')}</h3>
          <ol className="grid gap-2">
            {history.map((step) => (
              <li key={`${step.at}-${step.event}`} className="flex flex-wrap gap-x-4">
                <time className="figures text-steel" dateTime={new Date(step.at).toISOString()}>
                  {formats.dateTime(step.at)}
                </time>
                <span>{describe(step)}</span>
                {step.wording !== null && (
                  <span className="text-steel">{t('consentEvent.wording', { number: step.wording })}</span>
                )}
              </li>
            ))}
          </ol>
        </div>
      )}
    </section>
  );

  function describe({ event, by }: ConsentStep): string {
    if (event !== 'asked') return t(`consentEvent.${event}`);
    return by === null ? t('consentEvent.askedAgain') : t('consentEvent.asked', { name: by });
  }
}
