import type { QuestionName } from './answers.schema.ts';

/** The eight pages of the wizard in their order. The name of a page is the end of its address. */
export const wizardSteps = [
  'problem',
  'today',
  'settings',
  'safety',
  'around',
  'plan',
  'crew',
  'start',
] as const;
export type WizardStep = (typeof wizardSteps)[number];

export const questionsOf = {
  problem: ['job', 'result', 'measuring'],
  today: ['usual', 'worth', 'limit', 'watch', 'value', 'gauge'],
  settings: ['settings'],
  safety: ['hazards', 'stop', 'call', 'neverRun', 'parts'],
  around: ['around'],
  plan: ['spare'],
  crew: ['crew', 'pace'],
  start: ['look', 'ready'],
} as const satisfies Record<WizardStep, readonly QuestionName[]>;

export function isWizardStep(text: string | undefined): text is WizardStep {
  return wizardSteps.some((step) => step === text);
}

/** The page on which a question stands. */
export function stepOf(question: QuestionName): WizardStep {
  const step = wizardSteps.find((name) => (questionsOf[name] as readonly QuestionName[]).includes(question));
  if (!step) throw new RangeError(`stepOf: ${question} stands on no page`);
  return step;
}
