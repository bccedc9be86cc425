import type { SettingEnd } from '../../answer-choices.ts';
import type { AnswerOf } from '../../answers.schema.ts';
import { toRule } from '../../brief/brief-settings.ts';
import type { HardMix } from '../../plan.schema.ts';

export type LookAnswer = AnswerOf<'look'>;
export type LookedMix = LookAnswer['mixes'][number];
type Ends = Readonly<Record<string, SettingEnd>>;

/** What two mixes are compared by: the order in which settings are named says nothing. */
export function mixKey(ends: Ends): string {
  return Object.entries(ends)
    .map(([setting, end]) => `${setting}=${end}`)
    .sort()
    .join(' ');
}

/** Mixes that were ruled out and are in no plan any more. */
export function ruledOutMixes(look: LookAnswer, hardest: readonly HardMix[]): LookedMix[] {
  const present = new Set(hardest.map(({ ends }) => mixKey(ends)));
  return look.mixes.filter(({ ends, decision }) => decision === 'ruledOut' && !present.has(mixKey(ends)));
}

/** The decisions with this one taken in; those on mixes that are no longer among the hardest go, save what is ruled out. */
export function decideMix(look: LookAnswer, hardest: readonly HardMix[], decided: LookedMix): LookAnswer {
  const present = new Set(hardest.map(({ ends }) => mixKey(ends)));
  const kept = look.mixes.filter(
    ({ ends, decision }) =>
      mixKey(ends) !== mixKey(decided.ends) &&
      decision !== undefined &&
      (decision === 'ruledOut' || present.has(mixKey(ends))),
  );
  return { mixes: decided.decision === undefined ? kept : [...kept, decided] };
}

/** A mix as text that the rules of a brief can be compared with; null when one of its settings is there no more. */
export function mixRule(ends: Ends, settingIds: readonly string[]): string | null {
  const parts = Object.entries(ends).map(([setting, end]) => ({ setting, end }));
  const rule = toRule(parts, settingIds);
  return rule && ruleText(rule);
}

/** A rule of the core as text, its letters in order. */
export function ruleText(rule: Readonly<Record<string, number>>): string {
  return JSON.stringify(Object.entries(rule).sort(([one], [other]) => (one < other ? -1 : 1)));
}
