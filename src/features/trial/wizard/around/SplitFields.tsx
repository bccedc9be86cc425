import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { NumberInput } from '../../../../components/ui/NumberInput.tsx';
import type { ThingAnswer } from './AroundRow.tsx';

interface Props {
  readonly thing: 'batch' | 'shift' | 'machine';
  readonly answer: ThingAnswer;
  readonly errorAt: (pointer: string) => string | undefined;
  readonly onChange: (next: ThingAnswer) => void;
}

const counts = ['2', '4'];

/** How many shares the runs are split into, and how many runs one of them can take. */
export function SplitFields({ thing, answer, errorAt, onChange }: Props) {
  const { t } = useTranslation('wizard-safety');
  return (
    <div className="around-more">
      <p className="text-steel">{t(`around.splitHelp.${thing}`)}</p>
      <Choice
        id={`around-${thing}-count`}
        name={`#/${thing}/count`}
        legend={t(`around.splitCount.${thing}`)}
        options={counts.map((count) => ({ value: count, label: count }))}
        value={answer.count?.trim() || '2'}
        onChange={({ target }) => onChange({ ...answer, count: target.value })}
        error={errorAt(`#/${thing}/count`)}
      />
      <NumberInput
        id={`around-${thing}-each`}
        name={`#/${thing}/runsEach`}
        label={t(`around.runsEach.${thing}`)}
        mark={t('safety.optional')}
        maxLength={200}
        value={answer.runsEach ?? ''}
        onChange={({ target }) => onChange({ ...answer, runsEach: target.value })}
        error={errorAt(`#/${thing}/runsEach`)}
      />
    </div>
  );
}
