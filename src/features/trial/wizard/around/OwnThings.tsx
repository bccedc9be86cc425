import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Choice } from '../../../../components/ui/Choice.tsx';
import { TextInput } from '../../../../components/ui/TextInput.tsx';
import type { AnswerOf } from '../../answers.schema.ts';

type OwnThing = NonNullable<AnswerOf<'around'>['own']>[number];

interface Props {
  readonly own: readonly OwnThing[];
  readonly errorAt: (pointer: string) => string | undefined;
  readonly mayWrite: boolean;
  readonly onChange: (own: OwnThing[]) => void;
}

const mostOwn = 5;
/** A thing of one's own cannot be split: the plan knows no name for it. */
const ways = ['same', 'writeDown', 'noIssue'] as const;

/** Things that the shop adds by itself. */
export function OwnThings({ own, errorAt, mayWrite, onChange }: Props) {
  const { t } = useTranslation('wizard-safety');

  function replace(thing: OwnThing, next: OwnThing | null): void {
    onChange(own.flatMap((each) => (each === thing ? (next ?? []) : each)));
  }
  function add(): void {
    const id = crypto.randomUUID();
    onChange([...own, { id, way: 'writeDown' }]);
    requestAnimationFrame(() => document.getElementById(`own-${id}-name`)?.focus());
  }

  return (
    <>
      {own.map((thing, place) => (
        <fieldset key={thing.id} className="around-row">
          <legend className="sr-only">{t('around.ownUnnamed', { number: place + 1 })}</legend>
          <TextInput
            id={`own-${thing.id}-name`}
            name={`#/own/${place}/name`}
            label={t('around.ownName')}
            maxLength={200}
            autoComplete="off"
            value={thing.name ?? ''}
            onChange={({ target }) => replace(thing, { ...thing, name: target.value })}
            error={errorAt(`#/own/${place}/name`)}
          />
          <Choice
            id={`own-${thing.id}-way`}
            name={`#/own/${place}/way`}
            legend={t('around.ownWay')}
            options={ways.map((value) => ({ value, label: t(`around.way.${value}`) }))}
            value={thing.way ?? 'writeDown'}
            onChange={({ target }) =>
              replace(thing, { ...thing, way: ways.find((each) => each === target.value) })
            }
            error={errorAt(`#/own/${place}/way`)}
          />
          {mayWrite && (
            <div>
              <Button kind="quiet" icon="remove" onClick={() => replace(thing, null)}>
                {t('safety.remove')}
                <span className="sr-only">
                  {' '}
                  {thing.name || t('around.ownUnnamed', { number: place + 1 })}
                </span>
              </Button>
            </div>
          )}
        </fieldset>
      ))}
      {own.length < mostOwn && mayWrite && (
        <div>
          <Button icon="plus" onClick={add}>
            {t('around.add')}
          </Button>
        </div>
      )}
    </>
  );
}
