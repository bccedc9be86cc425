import { useFieldArray } from 'react-hook-form';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Disclosure } from '../../../components/ui/Disclosure.tsx';
import { QuestionPart } from './QuestionPart.tsx';
import { useForms, useQuestionForm } from './use-question-form.tsx';
import { WatchedResult } from './WatchedResult.tsx';

const mostWatched = 3;

/** Up to three results to keep an eye on, so that a better one is not bought with a worse other. */
export function WatchPart() {
  const { t } = useTranslation('wizard');
  const { mayWrite } = useForms();
  const form = useQuestionForm('watch');
  // The form's own key must not take the place of the result's id.
  const { fields, append, remove } = useFieldArray({
    control: form.control,
    name: 'results',
    keyName: 'key',
  });
  return (
    <QuestionPart>
      <Disclosure
        summary={t('today.watch', { count: fields.length, most: mostWatched })}
        startsOpen={fields.length > 0}
      >
        <div className="grid grid-cols-[minmax(0,1fr)] gap-6">
          <p className="text-steel">{t('today.watchHelp')}</p>
          {fields.map(({ key }, place) => (
            <WatchedResult key={key} form={form} place={place} onRemove={() => remove(place)} />
          ))}
          {mayWrite && fields.length < mostWatched && (
            <div>
              <Button
                icon="plus"
                onClick={() =>
                  append({ id: crypto.randomUUID() }, { focusName: `results.${fields.length}.name` })
                }
              >
                {t('today.watchAdd')}
              </Button>
            </div>
          )}
        </div>
      </Disclosure>
    </QuestionPart>
  );
}
