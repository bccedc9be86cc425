import { createContext, useContext } from 'react';
import type { Language } from '../../../i18n/languages.ts';
import type { Brief, Fact, GaugeCheck, PlannedRun, Proposal } from '../../../lib/doe/index.ts';
import type { AnswerOf, Answers, QuestionName } from '../answers.schema.ts';

/** Somebody who may run, measure or be called. */
export interface CrewMember {
  id: string;
  kind: 'person' | 'line phone';
  name: string;
  language: Language;
  roles: readonly string[];
  safetyPerson: boolean;
  consent: 'unasked' | 'asked' | 'agreed' | 'opted out';
  consentAt: number | null;
  /** When they may be texted, a line for each shift; none where no hours are kept, so that nothing may go out. */
  textingHours: readonly string[];
}

/** What the wizard knows of the shop. */
export interface WizardShop {
  name: string;
  currency: string;
  timeZone: string;
  planReview: 'never' | 'hazard' | 'always';
  people: readonly CrewMember[];
}

/** What is said of today's figures. */
export interface TodaySoFar {
  /** How far the result moves up or down by itself, about two standard deviations; null where nobody can say. */
  swing: number | null;
  /** Three differences worth a thought, smallest first; none where the swing is not known. */
  suggestions: readonly number[];
  /** Today's mean of past numbers. */
  mean: number | null;
  gauge: GaugeCheck | null;
}

/** What the answers mean so far, worked out beside the page: never an error, at most nothing yet. */
export interface SoFar {
  brief: Brief | null;
  /** At most four, best first; empty while there is not enough to say, or when nothing fits. */
  proposals: readonly Proposal[];
  /** Runs of the best proposal in an order as it might be; the real one is drawn at the start. */
  runs: readonly PlannedRun[];
  /** The runs of each proposal in the same way. */
  racks: readonly (readonly PlannedRun[])[];
  /** How many answers a plan still needs. */
  missing: number;
  /** Why nothing fits, and what to relax by how much. */
  misfit: { code: string; field: string; need: number | string | null } | null;
  /** What an experienced eye would remark, as facts. */
  coaching: readonly Fact[];
  today: TodaySoFar;
}

export interface WizardValue {
  trialId: string;
  answers: Answers;
  /** False where the reader may only look: another role, or a trial that has started. */
  mayWrite: boolean;
  /** Takes over what was typed; it is saved a moment later. */
  change<Name extends QuestionName>(question: Name, content: AnswerOf<Name>): void;
  /** Saves what is not saved yet, for what needs it on the server; done when each save has got its answer. */
  flush(): Promise<void>;
  soFar: SoFar;
  shop: WizardShop;
}

export const WizardContext = createContext<WizardValue | null>(null);

/** @throws RangeError outside the wizard's frame */
export function useWizard(): WizardValue {
  const value = useContext(WizardContext);
  if (!value) throw new RangeError('useWizard: no WizardFrame around it');
  return value;
}
