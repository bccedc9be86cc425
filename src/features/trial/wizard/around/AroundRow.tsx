import { useTranslation } from 'react-i18next';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import { type AroundThing, type AroundWay, waysFor } from '../../answer-choices.ts';
import type { AnswerOf } from '../../answers.schema.ts';
import { SplitFields } from './SplitFields.tsx';

export type ThingAnswer = NonNullable<AnswerOf<'around'>[AroundThing]>;

interface Props {
  readonly thing: AroundThing;
  readonly answer: ThingAnswer;
  readonly errorAt: (pointer: string) => string | undefined;
  /** What is wrong with it beside another thing. */
  readonly fault?: string | undefined;
  readonly onChange: (next: ThingAnswer) => void;
}

/** One thing that may change meanwhile, with the ways that are open to it. Crews are never compared. */
export function AroundRow({ thing, answer, errorAt, fault, onChange }: Props) {
  const { t } = useTranslation('wizard-safety');
  const ways: readonly AroundWay[] = waysFor[thing];
  const { way } = answer;
  return (
    <div className="around-row">
      <Choice
        id={`around-${thing}`}
        name={`#/${thing}/way`}
        legend={t(`around.thing.${thing}`)}
        help={thing === 'crew' ? t('around.neverCompare') : undefined}
        options={ways.map((value) => ({ value, label: t(`around.way.${value}`) }))}
        value={way ?? ''}
        onChange={({ target }) => onChange({ ...answer, way: ways.find((each) => each === target.value) })}
        error={fault ?? errorAt(`#/${thing}/way`)}
      />
      {way === 'split' && (thing === 'batch' || thing === 'shift' || thing === 'machine') && (
        <SplitFields thing={thing} answer={answer} errorAt={errorAt} onChange={onChange} />
      )}
      {way === 'writeDown' && (
        <TextInput
          id={`around-${thing}-words`}
          name={`#/${thing}/words`}
          label={t('around.words')}
          mark={t('safety.optional')}
          maxLength={200}
          autoComplete="off"
          value={answer.words ?? ''}
          onChange={({ target }) => onChange({ ...answer, words: target.value })}
        />
      )}
    </div>
  );
}
