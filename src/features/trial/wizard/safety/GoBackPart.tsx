import { useTranslation } from 'react-i18next';
import { QuestionPart } from '../QuestionPart.tsx';
import { panelNameOf, usualValueOf } from '../setting-words.ts';
import { useWizard } from '../wizard-context.ts';

/** The way back: every setting as it is on a normal day, taken from the page before. */
export function GoBackPart() {
  const { t } = useTranslation('wizard-safety');
  const { answers } = useWizard();
  const named = (answers.settings?.settings ?? []).filter((setting) => panelNameOf(setting) !== '');
  return (
    <QuestionPart title={t('safety.goBack')}>
      {named.length === 0 ? (
        <p className="text-steel">{t('safety.goBackNone')}</p>
      ) : (
        <div className="grid gap-3">
          <dl className="go-back">
            {named.map((setting) => (
              <div key={setting.id} className="go-back-setting">
                <dt translate="no">{panelNameOf(setting)}</dt>
                <dd>
                  {usualValueOf(setting) ?? <span className="text-caution">{t('safety.unknown')}</span>}
                </dd>
              </div>
            ))}
          </dl>
          <p className="text-steel">{t('safety.goBackFrom')}</p>
        </div>
      )}
    </QuestionPart>
  );
}
