import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { FieldError } from '../../../../components/ui/FieldError.tsx';
import type { AnswerOf, SettingAnswer } from '../../answers.schema.ts';
import { MixPartFields } from './MixPartFields.tsx';
import { countRuledOut } from './ruled-out.ts';

export type Mix = AnswerOf<'neverRun'>['mixes'][number];
export type MixPart = Mix['parts'][number];

interface Props {
  readonly mix: Mix;
  readonly place: number;
  readonly settings: readonly SettingAnswer[];
  readonly errorAt: (pointer: string) => string | undefined;
  readonly onChange: (next: Mix) => void;
  /** Left out for whoever may only look. */
  readonly onRemove: (() => void) | undefined;
}

/** One mix, as settings at one of their ends, and how many of all combinations it takes away. */
export function NeverRunMix({ mix, place, settings, errorAt, onChange, onRemove }: Props) {
  const { t } = useTranslation('wizard-safety');
  const { id, parts } = mix;
  const used = new Set(parts.map(({ setting }) => setting));
  const unused = settings.find((setting) => !used.has(setting.id));
  const isGone = parts.some(({ setting }) => !settings.some((each) => each.id === setting));
  const counted = countRuledOut(mix, settings);
  const fault = errorAt(`#/mixes/${place}/parts`) ?? (isGone ? t('safety.gone') : undefined);

  function replace(part: MixPart, next: MixPart | null): void {
    onChange({ ...mix, parts: parts.flatMap((each) => (each === part ? (next ?? []) : each)) });
  }

  return (
    <fieldset id={`mix-${id}`} className="mix">
      <legend className="field-label">{t('safety.mix', { number: place + 1 })}</legend>
      <div className="grid gap-4">
        {parts.map((part, partPlace) => (
          <MixPartFields
            // Two parts may name the same setting for a moment, so the place is the only key there is.
            key={`${id}-${String(partPlace)}`}
            id={`mix-${id}-${partPlace}`}
            name={`#/mixes/${place}/parts/${partPlace}/setting`}
            number={partPlace + 1}
            part={part}
            settings={settings}
            error={errorAt(`#/mixes/${place}/parts/${partPlace}/setting`)}
            onChange={(next) => replace(part, next)}
            onRemove={onRemove && parts.length > 2 ? () => replace(part, null) : undefined}
          />
        ))}
      </div>
      <FieldError id={`mix-${id}`}>{fault}</FieldError>
      <p role="status" className="font-semibold">
        {counted && t('safety.rulesOut', { count: counted.ruledOut, total: counted.corners })}
      </p>
      {onRemove && (
        <div className="button-row">
          {unused && (
            <Button
              kind="quiet"
              icon="plus"
              onClick={() => onChange({ ...mix, parts: [...parts, { setting: unused.id, end: 'high' }] })}
            >
              {t('safety.addSetting')}
            </Button>
          )}
          <Button kind="quiet" icon="remove" onClick={onRemove}>
            {t('safety.removeMix')}
          </Button>
        </div>
      )}
    </fieldset>
  );
}
