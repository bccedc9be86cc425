import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Select } from '../../../components/ui/Select.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import type { ModelForm } from './model-form.ts';

interface Props {
  readonly runNumbers: readonly number[];
  readonly without: ModelForm['without'];
  /** Places that lack a run or a reason. */
  readonly faults: readonly number[];
  readonly onChange: (without: ModelForm['without']) => void;
}

/** Runs to leave out, each with the reason in writing. */
export function LeftOutFields({ runNumbers, without, faults, onChange }: Props) {
  const { t } = useTranslation('audit-models');
  const change = (place: number, to: Partial<ModelForm['without'][number]>) =>
    onChange(without.map((each, at) => (at === place ? { ...each, ...to } : each)));
  return (
    <fieldset className="field left-out">
      <legend className="field-label">{t('form.without')}</legend>
      {without.map(({ run, reason }, place) => {
        const id = `left-out-${place}`;
        return (
          <div key={id} className="left-out-line">
            <Select
              id={`${id}-run`}
              label={t('form.run')}
              emptyLabel={t('form.pickRun')}
              value={run}
              onChange={({ target }) => change(place, { run: target.value })}
              options={runNumbers.map((number) => ({ value: String(number), label: String(number) }))}
            />
            <TextInput
              id={`${id}-reason`}
              label={t('form.reason')}
              maxLength={300}
              value={reason}
              onChange={({ target }) => change(place, { reason: target.value })}
              error={faults.includes(place) && t('form.reasonMissing')}
            />
            <Button
              kind="quiet"
              icon="remove"
              onClick={() => onChange(without.filter((_, at) => at !== place))}
            >
              {t('form.takeBack')}
            </Button>
          </div>
        );
      })}
      <div>
        <Button icon="plus" onClick={() => onChange([...without, { run: '', reason: '' }])}>
          {t('form.leaveOut')}
        </Button>
      </div>
    </fieldset>
  );
}
