import { type ReactNode, useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../../components/island/IslandRoot.tsx';
import { QuestionFrame } from '../../../components/ui/QuestionFrame.tsx';
import type { WizardStep } from '../questions.ts';
import type { AnswersStore } from './answers-store.ts';
import { ConflictCallouts } from './ConflictCallouts.tsx';
import { tellHead } from './head-news.ts';
import { SoFarLine } from './SoFarLine.tsx';
import { SoFarSide } from './SoFarSide.tsx';
import { StepActions } from './StepActions.tsx';
import { listToDo, seenSteps, stepStatesOf } from './step-states.ts';
import { useAnswers } from './use-answers.tsx';
import { type WizardForms, WizardFormsContext } from './use-question-form.tsx';
import { useShownSteps } from './use-shown-steps.ts';
import { useSoFar } from './use-so-far.ts';
import { type SoFar, WizardContext, type WizardValue } from './wizard-context.ts';
import { toDoHash, type WizardPageProps } from './wizard-page.ts';

interface FrameProps extends WizardPageProps {
  step: WizardStep;
  children: ReactNode;
  /** Stands in the place of <Next>: the last page starts the trial instead. */
  lastAction?: ReactNode;
}

const nothingYet: SoFar = {
  brief: null,
  proposals: [],
  runs: [],
  racks: [],
  missing: 0,
  misfit: null,
  coaching: [],
  today: { swing: null, suggestions: [], mean: null, gauge: null },
};

type Check = Parameters<WizardForms['addCheck']>[0];

/** The forms of the page, so that all can be checked at once and the first that is not content gets the focus. */
function useChecks(store: AnswersStore, mayWrite: boolean) {
  const [checks] = useState(() => new Set<Check>());
  const forms = useMemo(
    (): WizardForms => ({
      mayWrite,
      contentOf: store.contentOf,
      change: store.changeSoon,
      fill: store.fill,
      onReplaced: store.onReplaced,
      addCheck(check) {
        checks.add(check);
        return () => checks.delete(check);
      },
    }),
    [store, checks, mayWrite],
  );
  const check = useCallback(async (): Promise<void> => {
    let isContent = true;
    for (const each of checks) isContent = (await each(isContent)) && isContent;
  }, [checks]);
  return { forms, check };
}

function Frame({ step, children, lastAction, ...page }: FrameProps) {
  const { trialId, mayWrite, shop } = page;
  const { t } = useTranslation('wizard-frame');
  const { store, snapshot } = useAnswers(page);
  const { answers, save, conflicts } = snapshot;
  const soFar = useSoFar(answers);
  const shown = useShownSteps(trialId, step, answers);
  const seen = useMemo(() => seenSteps(shown), [shown]);
  const { forms, check } = useChecks(store, mayWrite);
  const top = useRef<HTMLDivElement>(null);

  useEffect(() => tellHead({ save, steps: stepStatesOf(answers, seen) }), [save, answers, seen]);
  useEffect(() => {
    // The keyboard begins at the question, not at the menu; whoever has pressed a key already stays where they are.
    if (document.activeElement === document.body) top.current?.querySelector('h1')?.focus();
    if (location.hash === toDoHash) void check();
  }, [check]);

  const value = useMemo(
    (): WizardValue => ({
      trialId,
      answers,
      mayWrite,
      change: store.change,
      flush: store.flush,
      soFar: soFar ?? nothingYet,
      shop,
    }),
    [trialId, answers, mayWrite, store, soFar, shop],
  );
  const side = { soFar, shop, toDo: listToDo(answers, seen), trialId, step, onCheck: () => void check() };
  return (
    <WizardContext value={value}>
      <WizardFormsContext value={forms}>
        <div ref={top}>
          <QuestionFrame
            sideLabel={t('soFar.title')}
            sideLine={<SoFarLine soFar={soFar} shop={shop} />}
            side={<SoFarSide {...side} />}
          >
            <ConflictCallouts conflicts={conflicts} shop={shop} onResolve={store.resolve} />
            <fieldset className="contents" disabled={!mayWrite}>
              {children}
            </fieldset>
            <StepActions
              trialId={trialId}
              step={step}
              lastAction={lastAction}
              beforeLeaving={mayWrite ? store.flush : undefined}
            />
          </QuestionFrame>
        </div>
      </WizardFormsContext>
    </WizardContext>
  );
}

/** Around the questions of one page: saving, what is known so far, and the way on. The page brings its own heading (`StepHead`). */
export function WizardFrame(props: FrameProps) {
  return (
    <IslandRoot language={props.language} words={props.words}>
      <Frame {...props} />
    </IslandRoot>
  );
}
