import { useTranslation } from 'react-i18next';
import { Checkbox } from '../../../components/ui/Checkbox.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { TextInput } from '../../../components/ui/TextInput.tsx';
import { LeftOutFields } from './LeftOutFields.tsx';
import type { ModelEditorProps } from './ModelEditor.tsx';
import { type FormFaults, type ModelForm, type TransformKind, transformsFor } from './model-form.ts';

interface Props extends Pick<ModelEditorProps, 'kind' | 'terms' | 'runNumbers' | 'hasStretches'> {
  readonly form: ModelForm;
  readonly faults: FormFaults;
  readonly onChange: (form: ModelForm) => void;
}

const errors = ['ladder', 'residual'] as const;

/** Everything in which a model may differ from the trial's own. */
export function ModelFields({ kind, terms, runNumbers, hasStretches, form, faults, onChange }: Props) {
  const { t } = useTranslation('audit-models');
  const set = (change: Partial<ModelForm>) => onChange({ ...form, ...change });
  const toggle = (term: string, isOn: boolean) =>
    set({ terms: isOn ? [...form.terms, term] : form.terms.filter((each) => each !== term) });
  return (
    <>
      <TextInput
        id="model-name"
        label={t('form.name')}
        maxLength={80}
        value={form.name}
        onChange={({ target }) => set({ name: target.value })}
        error={faults.name && t('form.nameMissing')}
      />
      <Choice
        id="model-terms"
        name="terms"
        several
        legend={t('form.terms')}
        options={terms.map((term) => ({ value: term, label: term }))}
        value={form.terms}
        onChange={({ target }) => toggle(target.value, target.checked)}
        error={faults.terms && t('form.termsMissing')}
      />
      <Checkbox
        id="model-hierarchy"
        label={t('form.refuseHierarchy')}
        help={t('form.hierarchyHelp')}
        checked={form.refuseHierarchy}
        onChange={({ target }) => set({ refuseHierarchy: target.checked })}
      />
      <Choice
        id="model-transform"
        name="transform"
        legend={t('form.transform')}
        options={transformsFor(kind).map((value) => ({ value, label: t(`transform.${value}`) }))}
        value={form.transform}
        onChange={({ target }) => set({ transform: target.value as TransformKind })}
      />
      {form.transform === 'boxCox' && (
        <NumberInput
          id="model-lambda"
          label={t('form.lambda')}
          value={form.lambda}
          onChange={({ target }) => set({ lambda: target.value })}
          error={faults.lambda && t('form.lambdaMissing')}
        />
      )}
      <LeftOutFields
        runNumbers={runNumbers}
        without={form.without}
        faults={faults.without}
        onChange={(without) => set({ without })}
      />
      {hasStretches && (
        <Checkbox
          id="model-stretches"
          label={t('form.stretches')}
          checked={form.stretchesAsBlocks}
          onChange={({ target }) => set({ stretchesAsBlocks: target.checked })}
        />
      )}
      <Choice
        id="model-error"
        name="error"
        legend={t('form.error')}
        options={errors.map((value) => ({ value, label: t(`error.${value}`) }))}
        value={form.error}
        onChange={({ target }) => set({ error: target.value === 'residual' ? 'residual' : 'ladder' })}
      />
    </>
  );
}
