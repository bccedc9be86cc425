import { useTranslation } from 'react-i18next';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { fieldSentence } from '../../../i18n/field-codes.ts';
import type { ResultItem } from '../result-items.ts';
import { listFigureFields } from './typed-figures.ts';

interface Props {
  readonly items: readonly ResultItem[];
  readonly typed: Readonly<Record<string, string>>;
  /** The code of what is wrong, by the field's key. */
  readonly faults: Readonly<Record<string, string>>;
  readonly onType: (key: string, text: string) => void;
}

/** A field for each figure that a run is asked for, result by result. */
export function FigureInputs({ items, typed, faults, onType }: Props) {
  const { t } = useTranslation(['board', 'errors']);
  return items.map((item) => (
    <fieldset key={item.result} className="field">
      <legend className="field-label">
        {item.lot === null ? item.name : t('board:outOf', { name: item.name, lot: item.lot })}
      </legend>
      <div className="board-figure-row">
        {listFigureFields([item]).map(({ key, part }) => (
          <NumberInput
            key={key}
            id={`figure-${key}`}
            label={item.parts > 1 ? t('board:part', { part }) : item.name}
            labelHidden={item.parts === 1}
            unit={item.unit === '' ? undefined : item.unit}
            value={typed[key] ?? ''}
            error={faults[key] === undefined ? undefined : fieldSentence(t, faults[key])}
            onChange={(event) => onType(key, event.target.value)}
          />
        ))}
      </div>
    </fieldset>
  ));
}
