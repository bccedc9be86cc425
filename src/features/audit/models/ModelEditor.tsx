import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../../components/island/use-submission.ts';
import { Button } from '../../../components/ui/Button.tsx';
import { Select } from '../../../components/ui/Select.tsx';
import type { Language } from '../../../i18n/languages.ts';
import { FaultCallout } from '../../people/FaultCallout.tsx';
import { removeModelCall, saveModelCall } from '../model.queries.ts';
import type { PublicModel } from '../model.schema.ts';
import { ModelFields } from './ModelFields.tsx';
import { emptyForm, type FormFaults, faultsOf, formOf, hasFaults, specOf } from './model-form.ts';

export interface ModelEditorProps {
  readonly trialId: string;
  readonly result: number;
  readonly kind: 'measured' | 'rejects' | 'flaws';
  /** All that may be in a model, and those of the trial's own. */
  readonly terms: readonly string[];
  readonly ownTerms: readonly string[];
  readonly runNumbers: readonly number[];
  readonly hasStretches: boolean;
  readonly stored: readonly PublicModel[];
}

interface Props extends ModelEditorProps {
  readonly language: Language;
  readonly words: ResourceLanguage;
}

/** Makes, changes and removes models of one's own. */
export function ModelEditor({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <Editor {...rest} />
    </IslandRoot>
  );
}

function Editor(props: ModelEditorProps) {
  const { trialId, result, ownTerms, stored } = props;
  const { t } = useTranslation('audit-models');
  const [id, setId] = useState(() => v7());
  const [form, setForm] = useState(() => emptyForm(ownTerms));
  const [faults, setFaults] = useState<FormFaults>({ without: [] });
  const { busy, fault, submit } = useSubmission();
  const isStored = stored.some((model) => model.id === id);

  function pick(modelId: string): void {
    const model = stored.find((each) => each.id === modelId);
    setId(model?.id ?? v7());
    setForm(model ? formOf(model) : emptyForm(ownTerms));
    setFaults({ without: [] });
  }

  function save(): void {
    const found = faultsOf(form);
    setFaults(found);
    if (hasFaults(found)) {
      requestAnimationFrame(() =>
        document.querySelector<HTMLElement>('.model-editor [aria-invalid]')?.focus(),
      );
      return;
    }
    void submit(async () => {
      await saveModelCall(trialId, id, { name: form.name.trim(), spec: specOf(form, result) });
      window.location.reload();
    });
  }

  function remove(): void {
    void submit(async () => {
      await removeModelCall(trialId, id);
      window.location.reload();
    });
  }

  return (
    <form
      className="model-editor"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        save();
      }}
    >
      {stored.length > 0 && (
        <Select
          id="model-pick"
          label={t('form.pick')}
          value={isStored ? id : ''}
          onChange={({ target }) => pick(target.value)}
          emptyLabel={t('form.new')}
          options={stored.map((model) => ({ value: model.id, label: model.name }))}
        />
      )}
      <ModelFields {...props} form={form} faults={faults} onChange={setForm} />
      <FaultCallout fault={fault}>
        {fault?.kind === 'refused' &&
          fault.problem.errors.map(({ pointer, detail }) => <p key={pointer}>{detail}</p>)}
      </FaultCallout>
      <div className="button-row">
        {isStored && (
          <Button icon="remove" onClick={remove}>
            {t('form.remove')}
          </Button>
        )}
        <Button type="submit" kind="primary" busy={busy} busyLabel={t('form.saving')}>
          {t('form.save')}
        </Button>
      </div>
    </form>
  );
}
