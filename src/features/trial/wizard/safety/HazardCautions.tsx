import { type ChangeEvent, useId } from 'react';
import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { HazardSign } from '../../../../components/ui/HazardSign.tsx';
import { TextArea } from '../../../../components/ui/TextArea.tsx';
import { type CautionName, cautionsOf } from '../../answer-choices.ts';
import type { AnswerOf } from '../../answers.schema.ts';
import { hazardSigns } from './hazard-signs.tsx';

type Ticked = AnswerOf<'hazards'>['ticked'][number];

interface Props {
  readonly ticked: Ticked;
  /** Of the field for own words. */
  readonly name: string;
  readonly error: string | undefined;
  readonly onChange: (next: Ticked) => void;
}

/** The usual cautions of one hazard, to tick those that are in place, and room for what else protects people. */
export function HazardCautions({ ticked, name, error, onChange }: Props) {
  const { t } = useTranslation(['wizard-safety', 'safety']);
  const headId = useId();
  const { hazard, cautions, protects = '' } = ticked;
  const offered: readonly CautionName[] = cautionsOf[hazard];

  function tick({ target: { value, checked } }: ChangeEvent<HTMLInputElement>): void {
    const next = offered.filter((caution) => (caution === value ? checked : cautions.includes(caution)));
    onChange({ ...ticked, cautions: next });
  }

  return (
    <section className="hazard-cautions" aria-labelledby={headId}>
      <h3 id={headId} className="flex items-center gap-3">
        <HazardSign hazard={hazardSigns[hazard]} size={28} />
        {t(`safety:hazard.${hazard}`)}
      </h3>
      <Choice
        id={`cautions-${hazard}`}
        name={`#/ticked/${hazard}/cautions`}
        legend={t('safety.cautions')}
        several
        options={offered.map((caution) => ({ value: caution, label: t(`safety:caution.${caution}`) }))}
        value={cautions}
        onChange={tick}
      />
      <TextArea
        id={`protects-${hazard}`}
        name={name}
        label={t('safety.protects')}
        mark={t('safety.protectsMark')}
        rows={2}
        maxLength={2_000}
        value={protects}
        onChange={(event) => onChange({ ...ticked, protects: event.target.value })}
        error={error}
      />
    </section>
  );
}
