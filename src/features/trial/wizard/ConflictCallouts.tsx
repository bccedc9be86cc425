import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { QuestionName } from '../answers.schema.ts';
import { wordOfChoice } from './choice-words.ts';
import { differencesOf } from './describe-difference.ts';
import type { AnswerConflict } from './stored-answers.ts';
import type { WizardShop } from './wizard-context.ts';

interface Props {
  readonly conflicts: readonly AnswerConflict[];
  readonly shop: WizardShop;
  readonly onResolve: (question: QuestionName, choice: 'mine' | 'theirs') => void;
}

function Conflict({ conflict, shop, onResolve }: Omit<Props, 'conflicts'> & { conflict: AnswerConflict }) {
  const { t, i18n } = useTranslation(['wizard-frame', 'wizard-safety', 'wizard-plan', 'safety']);
  const { question, mine, theirs } = conflict;
  const { time } = formatsFor(i18n.language as Language, shop.timeZone);

  function wordsOf(one: unknown, other: unknown): string {
    const words = differencesOf(one, other).map(({ kind, text }) =>
      kind === 'typed' ? text : wordOfChoice(text, t),
    );
    return words.length > 0 ? words.join(' · ') : t('conflict.nothing');
  }

  const name = t(`question.${question}`);
  return (
    <Callout
      tone="caution"
      live="assertive"
      title={
        theirs.savedBy === null
          ? t('conflict.titleNobody', { question: name })
          : t('conflict.title', { question: name, who: theirs.savedBy })
      }
      actions={
        <>
          <Button onClick={() => onResolve(question, 'theirs')}>{t('conflict.takeTheirs')}</Button>
          <Button onClick={() => onResolve(question, 'mine')}>{t('conflict.keepMine')}</Button>
        </>
      }
    >
      <p>{t('conflict.mine', { words: wordsOf(mine, theirs.content) })}</p>
      <p>
        {t('conflict.theirs', {
          time: theirs.savedAt === null ? '' : time(theirs.savedAt),
          words: wordsOf(theirs.content, mine),
        })}
      </p>
    </Callout>
  );
}

/** Somebody else saved the same answer: both texts are shown and neither is lost before the reader has chosen. */
export function ConflictCallouts({ conflicts, ...rest }: Props) {
  if (conflicts.length === 0) return null;
  return (
    <div className="mb-6 grid gap-4">
      {conflicts.map((conflict) => (
        <Conflict key={conflict.question} conflict={conflict} {...rest} />
      ))}
    </div>
  );
}
