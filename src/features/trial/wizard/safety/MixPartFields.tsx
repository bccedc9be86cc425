import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Select } from '../../../../components/ui/Select.tsx';
import { type SettingEnd, settingEnds } from '../../answer-choices.ts';
import type { SettingAnswer } from '../../answers.schema.ts';
import { endValueOf, panelNameOf } from '../setting-words.ts';
import type { MixPart } from './NeverRunMix.tsx';

interface Props {
  readonly id: string;
  readonly name: string;
  readonly number: number;
  readonly part: MixPart;
  readonly settings: readonly SettingAnswer[];
  readonly error: string | undefined;
  readonly onChange: (next: MixPart) => void;
  readonly onRemove: (() => void) | undefined;
}

/** One setting of a mix and the end at which it stands in it. */
export function MixPartFields({ id, name, number, part, settings, error, onChange, onRemove }: Props) {
  const { t } = useTranslation('wizard-safety');
  const chosen = settings.find((setting) => setting.id === part.setting);

  function wordOf(end: SettingEnd): string {
    const value = (chosen && endValueOf(chosen, end)) ?? t('safety.unknown');
    return chosen?.kind === 'choice' ? value : t(`safety.${end}`, { value });
  }

  return (
    <div className="field-row">
      <Select
        id={`${id}-setting`}
        name={name}
        label={t('safety.settingAt', { number })}
        emptyLabel={t('safety.pick')}
        options={settings.map((setting) => ({ value: setting.id, label: panelNameOf(setting) }))}
        value={chosen ? part.setting : ''}
        onChange={({ target }) => target.value && onChange({ ...part, setting: target.value })}
        error={error}
      />
      <Select
        id={`${id}-end`}
        label={t('safety.end')}
        options={settingEnds.map((end) => ({ value: end, label: wordOf(end) }))}
        value={part.end}
        onChange={({ target }) => onChange({ ...part, end: target.value === 'low' ? 'low' : 'high' })}
      />
      {onRemove && (
        <Button kind="quiet" icon="remove" onClick={onRemove}>
          {t('safety.remove')}
          <span className="sr-only"> {t('safety.settingAt', { number })}</span>
        </Button>
      )}
    </div>
  );
}
