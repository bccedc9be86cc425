import type { SameWords } from './locale-faults.ts';

/** Names, and words that a language shares with English. Everything else that equals the English text is not translated yet. */
export const sameWords: SameWords = {
  'common:product': ['es', 'pl', 'vi'],
  'board:no': ['es'],
  'people:role.supervisor': ['es'],
  'people:role.operator': ['pl'],
  'shop:poster.word.problem': ['pl'],
  'wizard-frame:step.problem': ['pl'],
  'wizard-frame:step.plan': ['es', 'pl'],
  'wizard-frame:step.start': ['pl'],
  'wizard:problem.minutesUnit': ['es', 'pl'],
  'wizard-plan:plan.minutesUnit': ['es', 'pl'],
  'wizard-plan:plan.upToHours': ['es'],
  'audit:plan.factor': ['es'],
  'audit:plan.powerLikely': ['es'],
  'audit:part.model': ['pl'],
  'audit-models:model': ['pl'],
  'audit-pack:api.no': ['es'],
  'audit-review:group.settings': ['es'],
  'audit-model:terms.t': ['es', 'pl', 'vi'],
  'audit-model:terms.p': ['es'],
  'audit-model:terms.f': ['es', 'pl', 'vi'],
  'audit-model:anova.sources.total': ['es'],
  'audit-model:anova.sources.model': ['pl'],
};
