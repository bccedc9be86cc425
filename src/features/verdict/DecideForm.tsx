import type { ResourceLanguage } from 'i18next';
import { type FormEvent, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { Choice } from '../../components/ui/Choice.tsx';
import { TextArea } from '../../components/ui/TextArea.tsx';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import { trialEventCall } from '../trial/trial.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly trialId: string;
  readonly revision: number;
  /** Whether check runs held: else the new settings are taken over unchecked, and only with a reason. */
  readonly held: boolean;
  /** Whether there are new settings to take over. */
  readonly hasNew: boolean;
}

const choices = ['adopt', 'notNow', 'keep'] as const;
type Decided = (typeof choices)[number];

/** What the shop does with the verdict, with a note. */
export function DecideForm({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <DecideParts {...rest} />
    </IslandRoot>
  );
}

/** The shortest reason that may stand on record. */
const shortestReason = 3;

function DecideParts({ trialId, revision, held, hasNew }: Omit<Props, 'language' | 'words'>) {
  const { t } = useTranslation('verdict-page');
  const [choice, setChoice] = useState<Decided | null>(null);
  const [note, setNote] = useState('');
  const [isAsked, setIsAsked] = useState(false);
  const { busy, fault, submit } = useSubmission();
  const needsReason = choice === 'adopt' && !held;
  const lacksReason = needsReason && note.trim().length < shortestReason;

  const send = (event: FormEvent) => {
    event.preventDefault();
    setIsAsked(true);
    if (choice === null || lacksReason) return;
    void submit(async () => {
      await trialEventCall(
        trialId,
        choice === 'adopt'
          ? { event: 'adopt', revision, unchecked: !held, note }
          : { event: 'not now', revision, keepToday: choice === 'keep', note },
      );
      window.location.reload();
    });
  };

  return (
    <form className="sheet verdict-decide" aria-labelledby="decide" onSubmit={send} noValidate>
      <h2 id="decide">{t('part.decide')}</h2>
      <Choice
        id="decision"
        name="decision"
        legend={t('decide.legend')}
        shape="cards"
        value={choice ?? ''}
        onChange={(event) => setChoice(choices.find((each) => each === event.currentTarget.value) ?? null)}
        error={isAsked && choice === null ? t('decide.choose') : undefined}
        options={[
          ...(hasNew
            ? [
                {
                  value: 'adopt',
                  label: held ? t('decide.adopt') : t('decide.unchecked'),
                  ...(held ? {} : { help: t('decide.uncheckedHelp') }),
                },
              ]
            : []),
          { value: 'notNow', label: t('decide.notNow') },
          { value: 'keep', label: t('decide.keep') },
        ]}
      />
      <TextArea
        id="note"
        label={needsReason ? t('decide.reason') : t('decide.note')}
        value={note}
        maxLength={1000}
        onChange={(event) => setNote(event.currentTarget.value)}
        error={isAsked && lacksReason ? t('decide.needsReason') : undefined}
      />
      <FaultCallout fault={fault} />
      <div className="button-row">
        <Button type="submit" kind="primary" busy={busy} busyLabel={t('decide.saving')}>
          {t('decide.save')}
        </Button>
      </div>
    </form>
  );
}
