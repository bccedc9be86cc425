import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { useSubmission } from '../../../../components/island/use-submission.ts';
import { Button } from '../../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { Loading } from '../../../../components/ui/Loading.tsx';
import { languageNames } from '../../../../i18n/languages.ts';
import { TrialFault } from '../../TrialFault.tsx';
import { previewTextsCall, sendPracticeCall } from '../../texts.queries.ts';
import type { Practice } from '../../texts-preview.schema.ts';
import { QuestionPart } from '../QuestionPart.tsx';
import { useWizard } from '../wizard-context.ts';
import { addressOf } from '../wizard-page.ts';
import { TextCard } from './TextCard.tsx';

/** Longer than it takes until what was typed is saved. */
const settledAfter = 1_500;

/** The preview follows what is saved: it is asked for again once a change has settled. */
function useTexts() {
  const { trialId, answers } = useWizard();
  const client = useQueryClient();
  const query = useQuery({ queryKey: ['trial texts', trialId], queryFn: () => previewTextsCall(trialId) });
  const first = useRef(answers);
  useEffect(() => {
    if (answers === first.current) return;
    const ask = () => void client.invalidateQueries({ queryKey: ['trial texts', trialId] });
    const timer = setTimeout(ask, settledAfter);
    return () => clearTimeout(timer);
  }, [answers, client, trialId]);
  return query;
}

/** Run 1 in each language of the crew, and on the reader's own phone as practice. */
export function TextsPart() {
  const { t } = useTranslation('wizard-plan');
  const { trialId, mayWrite, flush } = useWizard();
  const { data, isError, refetch } = useTexts();
  const [chosen, setChosen] = useState<string | null>(null);
  const [outcome, setOutcome] = useState<Practice['outcome'] | null>(null);
  const { busy, fault, submit } = useSubmission();
  const send = () =>
    submit(async () => {
      setOutcome(null);
      await flush();
      setOutcome((await sendPracticeCall(trialId)).outcome);
    });

  if (isError) {
    return (
      <QuestionPart title={t('texts.title')}>
        <Callout
          tone="caution"
          title={t('texts.notLoaded')}
          actions={<Button onClick={() => void refetch()}>{t('texts.tryAgain')}</Button>}
        >
          {t('texts.notLoadedWords')}
        </Callout>
      </QuestionPart>
    );
  }
  if (!data) return <Loading label={t('texts.loading')} lines={3} />;
  const { texts, whole } = data;
  const shown = texts.find(({ language }) => language === chosen) ?? texts[0];
  if (!shown) {
    return (
      <QuestionPart title={t('texts.title')}>
        <Callout
          tone="info"
          actions={<ButtonLink href={addressOf(trialId, 'plan')}>{t('texts.toPlan')}</ButtonLink>}
        >
          {t('texts.noPlan')}
        </Callout>
      </QuestionPart>
    );
  }
  const languages = [...new Set(texts.map(({ language }) => language))];
  return (
    <QuestionPart title={t('texts.title')} help={t('texts.help')}>
      {languages.length > 1 && (
        <Choice
          id="texts-language"
          name="texts-language"
          legend={t('texts.language')}
          options={languages.map((language) => ({ value: language, label: languageNames[language] }))}
          value={shown.language}
          onChange={(event) => setChosen(event.currentTarget.value)}
        />
      )}
      {texts
        .filter(({ language }) => language === shown.language)
        .map((text) => (
          <TextCard key={text.body} text={text} />
        ))}
      {whole && (
        <p>
          {t('texts.whole', {
            texts: t('texts.count', { count: whole.texts }),
            segments: t('texts.segments', { count: whole.segments }),
          })}
        </p>
      )}
      {mayWrite && (
        <div className="grid gap-3">
          <TrialFault fault={fault} />
          <div className="button-row">
            <Button icon="send" busy={busy} busyLabel={t('texts.sending')} onClick={send}>
              {t('texts.send')}
            </Button>
          </div>
          <p role="status" className={outcome ? undefined : 'sr-only'}>
            {outcome && t(`texts.outcome.${outcome}`)}
          </p>
          <p className="text-steel">{t('texts.practice')}</p>
        </div>
      )}
    </QuestionPart>
  );
}
