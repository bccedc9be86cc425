import { render } from '@testing-library/react';
import { type ReactNode, useMemo, useState } from 'react';
import { IslandRoot } from '../../src/components/island/IslandRoot.tsx';
import type { Answers, QuestionName } from '../../src/features/trial/answers.schema.ts';
import { WizardFormsContext } from '../../src/features/trial/wizard/use-question-form.tsx';
import {
  type CrewMember,
  WizardContext,
  type WizardShop,
  type WizardValue,
} from '../../src/features/trial/wizard/wizard-context.ts';
import { workOutSoFar } from '../../src/features/trial/wizard/work-out-so-far.ts';
import type { Language } from '../../src/i18n/languages.ts';
import type { Namespace } from '../../src/i18n/namespaces.ts';
import { wordsFor } from '../../src/i18n/resources.ts';

interface Wishes {
  answers: Answers;
  namespaces: readonly Namespace[];
  people?: readonly CrewMember[];
  mayWrite?: boolean;
  language?: Language;
}

function Stand({
  wishes,
  told,
  children,
}: {
  wishes: Wishes;
  told: { answers: Answers };
  children: ReactNode;
}) {
  const [answers, setAnswers] = useState(wishes.answers);
  told.answers = answers;
  const soFar = useMemo(() => workOutSoFar(answers), [answers]);
  const shop: WizardShop = {
    name: 'Harrow Lane Foods',
    currency: 'USD',
    timeZone: 'America/New_York',
    planReview: 'hazard',
    people: wishes.people ?? [],
  };
  const value: WizardValue = {
    trialId: '0193b3a0-0000-7000-8000-000000000001',
    answers,
    mayWrite: wishes.mayWrite ?? true,
    change: (question, content) => setAnswers((before) => ({ ...before, [question]: content })),
    flush: async () => undefined,
    soFar,
    shop,
  };
  const { mayWrite, change } = value;
  const [stillChange] = useState(() => change);
  const forms = useMemo(
    () => ({
      mayWrite,
      change: stillChange,
      contentOf: (question: QuestionName) => told.answers[question],
      fill: () => undefined,
      onReplaced: () => () => undefined,
      addCheck: () => () => undefined,
    }),
    [told, mayWrite, stillChange],
  );
  return (
    <WizardFormsContext value={forms}>
      <WizardContext value={value}>{children}</WizardContext>
    </WizardFormsContext>
  );
}

/** Shows a part of the wizard in a stand of its frame: answers in memory, plans worked out at once. Answers what was typed. */
export function renderInWizard(part: ReactNode, wishes: Wishes): { answers: Answers } {
  const { language = 'en', namespaces } = wishes;
  const told = { answers: wishes.answers };
  render(
    <IslandRoot language={language} words={wordsFor(language, ['wizard-frame', 'errors', ...namespaces])}>
      <Stand wishes={wishes} told={told}>
        {part}
      </Stand>
    </IslandRoot>,
  );
  return told;
}
