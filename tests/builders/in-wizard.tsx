import { type RenderResult, render } from '@testing-library/react';
import { type ReactNode, useMemo, useState } from 'react';
import { IslandRoot } from '../../src/components/island/IslandRoot.tsx';
import type { Answers } from '../../src/features/trial/answers.schema.ts';
import { type WizardForms, WizardFormsContext } from '../../src/features/trial/wizard/use-question-form.tsx';
import {
  type CrewMember,
  type SoFar,
  WizardContext,
  type WizardShop,
} from '../../src/features/trial/wizard/wizard-context.ts';
import { workOutSoFar } from '../../src/features/trial/wizard/work-out-so-far.ts';
import type { Namespace } from '../../src/i18n/namespaces.ts';
import { wordsFor } from '../../src/i18n/resources.ts';

export const nothingSoFar: SoFar = {
  brief: null,
  proposals: [],
  runs: [],
  racks: [],
  missing: 0,
  misfit: null,
  coaching: [],
  today: { swing: null, suggestions: [], mean: null, gauge: null },
};

export function crewMember(more: Partial<CrewMember> & Pick<CrewMember, 'id'>): CrewMember {
  return {
    kind: 'person',
    name: more.id,
    language: 'en',
    roles: ['operator'],
    safetyPerson: false,
    consent: 'agreed',
    consentAt: 0,
    textingHours: ['Mon–Fri 06:00–14:00'],
    ...more,
  };
}

export function wizardShop(more: Partial<WizardShop> = {}): WizardShop {
  return {
    name: 'Test shop',
    currency: 'EUR',
    timeZone: 'Europe/Warsaw',
    planReview: 'hazard',
    people: [crewMember({ id: 'ana', name: 'Ana' })],
    ...more,
  };
}

interface Around {
  answers?: Answers;
  shop?: WizardShop;
  /** `worked out`: from the answers as they stand, at once. */
  soFar?: SoFar | 'worked out';
  mayWrite?: boolean;
  /** Those of the page that the part stands on. */
  namespaces?: readonly Namespace[];
}

interface Kept {
  answers: Answers;
  checks: Set<(focus: boolean) => Promise<boolean>>;
}

/** The trial that the parts believe to be on. */
export const shownTrialId = 'trial';

/** There is nobody to save to. */
async function flush(): Promise<void> {}

/** Keeps the answers in memory, where the test can look at them. */
function MemoryFrame(
  props: Required<Omit<Around, 'answers' | 'namespaces'>> & { kept: Kept; children: ReactNode },
) {
  const { kept, children, shop, mayWrite } = props;
  const [answers, setAnswers] = useState(kept.answers);
  kept.answers = answers;
  const soFar = useMemo(
    () => (props.soFar === 'worked out' ? workOutSoFar(answers) : props.soFar),
    [answers, props.soFar],
  );
  const forms = useMemo(
    (): WizardForms => ({
      contentOf: (question) => kept.answers[question],
      fill: (question, content) => setAnswers((before) => ({ ...before, [question]: content })),
      onReplaced: () => () => undefined,
      addCheck(check) {
        kept.checks.add(check);
        return () => kept.checks.delete(check);
      },
      mayWrite,
      change: (question, content) => setAnswers((before) => ({ ...before, [question]: content })),
    }),
    [kept, mayWrite],
  );
  return (
    <WizardContext
      value={{ trialId: shownTrialId, answers, mayWrite, soFar, shop, change: forms.fill, flush }}
    >
      <WizardFormsContext value={forms}>
        <fieldset disabled={!mayWrite}>{children}</fieldset>
      </WizardFormsContext>
    </WizardContext>
  );
}

/** Renders what a page of the wizard asks with all that it leans on, and tells what was answered. */
export function renderInWizard(
  children: ReactNode,
  {
    answers = {},
    shop = wizardShop(),
    soFar = nothingSoFar,
    mayWrite = true,
    namespaces = ['wizard-safety', 'safety'],
  }: Around = {},
): RenderResult & { answers: () => Answers; check: () => Promise<void> } {
  const kept: Kept = { answers, checks: new Set() };
  const words = wordsFor('en', ['wizard-frame', 'errors', ...namespaces]);
  const rendered = render(
    <IslandRoot language="en" words={words}>
      <MemoryFrame kept={kept} shop={shop} soFar={soFar} mayWrite={mayWrite}>
        {children}
      </MemoryFrame>
    </IslandRoot>,
  );
  return {
    ...rendered,
    answers: () => kept.answers,
    async check() {
      let isContent = true;
      for (const each of kept.checks) isContent = (await each(isContent)) && isContent;
    },
  };
}
