import type { TFunction } from 'i18next';
import {
  aroundWays,
  cautionNames,
  hazardNames,
  lookDecisions,
  paces,
  partsFates,
  readyChecks,
  runWays,
  stopRules,
} from '../answer-choices.ts';

/** A choice of the first pages that has a short word of its own (`chosen` in the words of the frame). */
const wordedChoices = [
  'more',
  'less',
  'target',
  'measured',
  'scored',
  'rejects',
  'flaws',
  'operator',
  'other',
  'atOnce',
  'minutes',
  'later',
  'mean',
  'part',
  'low',
  'high',
  'neither',
  'notSure',
  'noLimit',
  'hard',
] as const;
export type WordedChoice = (typeof wordedChoices)[number];

type Words = TFunction<['wizard-frame', 'wizard-safety', 'wizard-plan', 'safety']>;

function within<Name extends string>(names: readonly Name[], name: string): Name | undefined {
  return names.find((each) => each === name);
}

/** What the reader has chosen, as their page says it; choices of pages whose words are not here are only called another choice. */
export function wordOfChoice(name: string, t: Words): string {
  const short = within(wordedChoices, name);
  if (short) return t(`wizard-frame:chosen.${short}`);
  const otherwise = { defaultValue: t('wizard-frame:conflict.otherChoice') };
  const [hazard, caution, stop] = [
    within(hazardNames, name),
    within(cautionNames, name),
    within(stopRules, name),
  ];
  if (hazard) return t(`safety:hazard.${hazard}`, otherwise);
  if (caution) return t(`safety:caution.${caution}`, otherwise);
  if (stop) return t(`safety:stop.${stop}`, otherwise);
  const [fate, around, decision] = [
    within(partsFates, name),
    within(aroundWays, name),
    within(lookDecisions, name),
  ];
  if (fate) return t(`wizard-safety:safety.fate.${fate}`, otherwise);
  if (around) return t(`wizard-safety:around.way.${around}`, otherwise);
  if (decision) return t(`wizard-safety:start.decision.${decision}`, otherwise);
  const [check, way, pace] = [within(readyChecks, name), within(runWays, name), within(paces, name)];
  if (check) return t(`wizard-safety:start.check.${check}`, otherwise);
  if (way) return t(`wizard-plan:crew.by.${way}`, otherwise);
  if (pace) return t(`wizard-plan:pace.nexts.${pace}`, otherwise);
  return otherwise.defaultValue;
}
