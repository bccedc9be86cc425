import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import { isLanguage, type Language, languageNames, languages } from '../../../../i18n/languages.ts';
import type { AnswerOf } from '../../answers.schema.ts';
import { missingVersions } from '../../missing-answers.ts';
import { useWizard } from '../wizard-context.ts';
import { crewLanguages } from './crew-languages.ts';

type Own = NonNullable<AnswerOf<'stop'>['own']>;

interface Props {
  readonly own: Own;
  readonly onChange: (own: Own) => void;
  readonly errorAt: (pointer: string) => string | undefined;
}

function idOf(language: Language): string {
  return `stop-own-${language}`;
}

/** A stop rule in the shop's own words, once in each language of the crew; a version that is missing is named. */
export function OwnStopRule({ own, onChange, errorAt }: Props) {
  const { t, i18n } = useTranslation('wizard-safety');
  const { answers, shop } = useWizard();
  const reader = i18n.language as Language;
  const crew = crewLanguages(answers, shop.people);
  const missing = missingVersions(answers, crew)
    .map(({ values }) => values?.['language'])
    .filter(isLanguage);
  const isSaid = languages.some((language) => own[language]?.trim());
  // Before anything is said one field is enough: the reader's, if the crew reads it.
  const first = crew.includes(reader) || crew.length === 0 ? reader : (crew[0] ?? reader);
  const shown = languages.filter(
    (language) => language === first || own[language] || (isSaid && crew.includes(language)),
  );
  const names = new Intl.DisplayNames(reader, { type: 'language' });

  return (
    <fieldset className="field">
      <legend className="field-label">
        {t('safety.own')} <span className="field-mark">{t('safety.optional')}</span>
      </legend>
      <p className="field-help">{t('safety.ownHelp')}</p>
      <div className="grid gap-4">
        {shown.map((language) => (
          <TextInput
            key={language}
            id={idOf(language)}
            name={`#/own/${language}`}
            label={<span lang={language}>{languageNames[language]}</span>}
            lang={language}
            maxLength={200}
            autoComplete="off"
            value={own[language] ?? ''}
            onChange={(event) => onChange({ ...own, [language]: event.target.value })}
            error={errorAt(`#/own/${language}`)}
          />
        ))}
        <div role="status" className="empty:hidden">
          {missing.length > 0 && (
            <Callout
              tone="caution"
              title={t('safety.ownMissingTitle', {
                languages: formatsFor(reader, shop.timeZone).list(
                  missing.map((name) => names.of(name) ?? name),
                ),
              })}
              actions={
                <Button onClick={() => document.getElementById(idOf(missing[0] ?? reader))?.focus()}>
                  {t('safety.ownAdd')}
                </Button>
              }
            >
              {t('safety.ownMissingWords')}
            </Callout>
          )}
        </div>
      </div>
    </fieldset>
  );
}
