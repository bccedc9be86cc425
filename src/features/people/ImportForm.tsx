import type { ResourceLanguage } from 'i18next';
import { type FormEvent, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import type { ServerProblem } from '../../components/island/call-server.ts';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { ButtonLink } from '../../components/ui/ButtonLink.tsx';
import { buttonClass } from '../../components/ui/button-class.ts';
import { Callout } from '../../components/ui/Callout.tsx';
import { Field } from '../../components/ui/Field.tsx';
import { Icon } from '../../components/ui/Icon.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { countCsvRows } from './csv.ts';
import { FaultCallout } from './FaultCallout.tsx';
import { ImportFindings } from './ImportFindings.tsx';
import { type ImportPreview, importLimits } from './import.schema.ts';
import { importPeopleCall } from './people.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
}

/** Brings a list of people in: first a look at every row, then all of them at once or nobody. */
export function ImportForm({ language, words }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <ImportSteps language={language} />
    </IslandRoot>
  );
}

function ImportSteps({ language }: Pick<Props, 'language'>) {
  const { t } = useTranslation('people');
  const formats = formatsFor(language, 'UTC');
  const input = useRef<HTMLInputElement>(null);
  const [fileFault, setFileFault] = useState<string | null>(null);
  const [preview, setPreview] = useState<ImportPreview | null>(null);
  const [fileName, setFileName] = useState<string | null>(null);
  const [isRepeat, setRepeat] = useState(false);
  const { busy, fault, submit, clearFault } = useSubmission((problem: ServerProblem) =>
    setRepeat(problem.code === 'already-there'),
  );

  function forget(): void {
    setFileName(input.current?.files?.[0]?.name ?? null);
    setPreview(null);
    setFileFault(null);
    setRepeat(false);
    clearFault();
  }

  /** Too large a file is not sent at all: what is wrong with it can be said right here. */
  async function findFileFault(file: File | undefined): Promise<string | null> {
    if (!file) return t('import.noFile');
    if (file.size <= importLimits.bytes) return null;
    const rows = Math.max(countCsvRows(await file.text()) - 1, 0);
    const limit = formats.number(importLimits.rows);
    return t('import.tooLarge', { rows: formats.number(rows), limit });
  }

  const send = (digest: string | null) =>
    submit(async () => {
      const file = input.current?.files?.[0];
      const why = await findFileFault(file);
      setFileFault(why);
      if (why !== null || !file) return input.current?.focus();
      setPreview(await importPeopleCall(file, digest));
    });

  function check(event: FormEvent): void {
    event.preventDefault();
    forget();
    void send(null);
  }

  const isReady = preview !== null && preview.fileFault === null && preview.faultCount === 0;
  if (preview && preview.added > 0) {
    return (
      <Callout
        tone="good"
        live="polite"
        title={t('import.done', { count: preview.added })}
        actions={<ButtonLink href="/people?show=not+asked">{t('import.toPeople')}</ButtonLink>}
      >
        {t('import.doneWords')}
      </Callout>
    );
  }
  return (
    <form className="sheet grid gap-6" onSubmit={check} noValidate>
      <Field id="file" label={t('import.file')} help={t('import.fileHelp')} error={fileFault}>
        {(wiring) => (
          <div className="flex flex-wrap items-center gap-3">
            <label
              className={`${buttonClass({})} has-focus-visible:outline-3 has-focus-visible:outline-petrol`}
            >
              <Icon name="paper" />
              {t('import.choose')}
              <input
                {...wiring}
                ref={input}
                type="file"
                accept=".csv,text/csv"
                className="sr-only"
                onChange={forget}
              />
            </label>
            <span>{fileName ?? t('import.noneChosen')}</span>
          </div>
        )}
      </Field>
      {preview && <ImportFindings preview={preview} language={language} />}
      {isRepeat ? (
        <Callout tone="info" live="polite">
          {t('import.before')}
        </Callout>
      ) : (
        <FaultCallout fault={fault} />
      )}
      <div className="button-row">
        <Button
          kind={isReady ? 'secondary' : 'primary'}
          type="submit"
          busy={busy && !isReady}
          busyLabel={t('import.checking')}
        >
          {t('import.check')}
        </Button>
        {isReady && (
          <Button
            kind="primary"
            busy={busy}
            busyLabel={t('import.adding')}
            onClick={() => send(preview.digest)}
          >
            {t('import.add', { count: preview.rows })}
          </Button>
        )}
      </div>
    </form>
  );
}
