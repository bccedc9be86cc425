import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { ResourceLanguage } from 'i18next';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { ButtonLink } from '../../components/ui/ButtonLink.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import { CheckSteps } from './CheckSteps.tsx';
import { CopyLine } from './CopyLine.tsx';
import { startTextsCheckCall, textsCheckOptions } from './shop.queries.ts';
import type { TextsCheck } from './texts-check.schema.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly first: TextsCheck;
  readonly timeZone: string;
}

/** Lets an admin see with one text that texts work both ways, or what is wrong. */
export function TextsCheckPanel({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <CheckParts language={language} {...rest} />
    </IslandRoot>
  );
}

function explainStop(check: TextsCheck): 'noSender' | 'noPhone' | 'optedOut' | null {
  if (check.sender === null) return 'noSender';
  if (check.phone === null) return 'noPhone';
  return check.consent === 'opted out' ? 'optedOut' : null;
}

function CheckParts({ first, language, timeZone }: Omit<Props, 'words'>) {
  const { t } = useTranslation('shop');
  const client = useQueryClient();
  const options = textsCheckOptions(first);
  const { data: check, isError, dataUpdatedAt } = useQuery(options);
  const { busy, fault, submit } = useSubmission();
  const formats = formatsFor(language, timeZone);
  const stop = explainStop(check);
  const start = () =>
    submit(async () => client.setQueryData(options.queryKey, await startTextsCheckCall()) && undefined);

  return (
    <div className="grid max-w-180 gap-8">
      <section className="sheet grid gap-6" aria-labelledby="set-up">
        <h2 id="set-up">{t('check.setUp')}</h2>
        <CopyLine label={t('check.sender')} value={check.sender} missing={t('check.noSender')} />
        <CopyLine label={t('check.webhook')} help={t('check.webhookHelp')} value={check.webhook} missing="" />
      </section>
      <section className="sheet grid gap-6" aria-labelledby="check">
        <h2 id="check">{t('check.title')}</h2>
        {stop ? (
          <Callout
            tone="caution"
            actions={
              stop === 'noPhone' ? (
                <ButtonLink href={`/people/${check.personId}`}>{t('check.toSelf')}</ButtonLink>
              ) : undefined
            }
          >
            {t(`check.${stop}`)}
          </Callout>
        ) : (
          <p>
            {t('check.to', { phone: check.phone ?? '' })}{' '}
            {check.consent !== 'agreed' && t('check.consentFirst')}
          </p>
        )}
        {check.startedAt !== null && <CheckSteps check={check} />}
        {check.isDone && (
          <Callout tone="good" live="polite">
            {t('check.done')}
          </Callout>
        )}
        {isError && (
          <Callout tone="caution" live="polite">
            {t('check.stale', { time: formats.time(dataUpdatedAt) })}
          </Callout>
        )}
        <FaultCallout fault={fault} />
        <div className="button-row">
          <Button
            kind="primary"
            icon="text"
            disabled={stop !== null}
            busy={busy}
            busyLabel={t('check.starting')}
            onClick={start}
          >
            {check.startedAt === null ? t('check.start') : t('check.again')}
          </Button>
        </div>
      </section>
    </div>
  );
}
