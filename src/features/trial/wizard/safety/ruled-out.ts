import { type Brief, countForbidden, type ForbiddenRule, isForbidden } from '../../../../lib/doe/index.ts';
import type { AnswerOf, SettingAnswer } from '../../answers.schema.ts';
import { toRule } from '../../brief/brief-settings.ts';

type Mix = AnswerOf<'neverRun'>['mixes'][number];

function ruleOf(mix: Mix, settings: readonly SettingAnswer[]): ForbiddenRule | null {
  const named = new Set(mix.parts.map(({ setting }) => setting));
  // One setting alone, or the same twice, is no mix yet.
  if (named.size < 2 || named.size < mix.parts.length) return null;
  return toRule(
    mix.parts,
    settings.map(({ id }) => id),
  );
}

/** How many of all combinations a mix takes away; null while it is no mix, or names a setting that is there no more. */
export function countRuledOut(
  mix: Mix,
  settings: readonly SettingAnswer[],
): { ruledOut: number; corners: number } | null {
  const rule = ruleOf(mix, settings);
  return rule && countForbidden(settings, rule);
}

/** Whether the mixes together take away every combination there is. */
export function leavesNothing(mixes: readonly Mix[], settings: readonly SettingAnswer[]): boolean {
  const rules = mixes.map((mix) => ruleOf(mix, settings)).filter((rule) => rule !== null);
  const brief: Pick<Brief, 'forbidden'> = { forbidden: rules };
  const corners = Array.from({ length: 2 ** settings.length }, (_, corner) =>
    settings.map((_setting, place) => ((corner >> place) & 1 ? 1 : -1)),
  );
  return rules.length > 0 && corners.every((corner) => isForbidden(brief, corner));
}
