import { useTranslation } from 'react-i18next';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Choice } from '../../../components/ui/Choice.tsx';
import { type StarterName, starterNames } from '../answer-choices.ts';
import { QuestionPart } from './QuestionPart.tsx';
import { useStarter } from './use-starter.tsx';
import { useWizard } from './wizard-context.ts';

/** The nearest job, whose usual answers are a beginning; or none, or an earlier trial. */
export function JobPart() {
  const { t } = useTranslation('wizard');
  const { answers } = useWizard();
  const begin = useStarter();
  return (
    <QuestionPart>
      <Choice
        id="starter"
        name="starter"
        legend={t('problem.starter')}
        help={t('problem.starterHelp')}
        options={starterNames.map((name) => ({ value: name, label: t(`problem.starters.${name}`) }))}
        value={answers.job?.starter ?? ''}
        onChange={(event) => begin(event.currentTarget.value as StarterName)}
      />
      <div>
        <ButtonLink kind="quiet" href="/trials" icon="copy">
          {t('problem.copy')}
        </ButtonLink>
      </div>
    </QuestionPart>
  );
}
