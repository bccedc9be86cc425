import type { FactorSpec, ForbiddenRule } from '../../../lib/doe/index.ts';
import type { SettingEnd } from '../answer-choices.ts';
import type { FinishedSetting } from '../finished/settings.schema.ts';
import { present } from './brief-result.ts';

function mannersOf(setting: FinishedSetting) {
  const { name, panelName, hard, settleMinutes, discardParts, harderEnd } = setting;
  return {
    name,
    ...present({
      panelName: panelName === '' ? null : panelName,
      hardToChange: hard ? true : null,
      settleMinutes,
      discardParts,
      harderEnd: harderEnd === 'neither' ? null : harderEnd,
    }),
  };
}

export function toFactor(setting: FinishedSetting): FactorSpec {
  const manners = mannersOf(setting);
  if (setting.kind === 'choice') {
    const { low, high, usual } = setting;
    return { ...manners, kind: 'choice', low, high, usual };
  }
  const { unit, low, high, usual, step, min, max } = setting;
  return { ...manners, kind: 'number', unit, low, high, usual, ...present({ step, min, max }) };
}

/** The letter that the core knows a setting by: its place. Undefined for one that is there no more. */
export function letterOf(settingIds: readonly string[], id: string): string | undefined {
  const place = settingIds.indexOf(id);
  return place < 0 ? undefined : String.fromCharCode(65 + place);
}

const levelOf: Record<SettingEnd, -1 | 1> = { low: -1, high: 1 };

/** A mix as a rule of the core; null when it names a setting that is there no more. */
export function toRule(
  ends: readonly { setting: string; end: SettingEnd }[],
  settingIds: readonly string[],
): ForbiddenRule | null {
  const rule: ForbiddenRule = {};
  for (const { setting, end } of ends) {
    const letter = letterOf(settingIds, setting);
    if (letter === undefined) return null;
    rule[letter] = levelOf[end];
  }
  return Object.keys(rule).length === 0 ? null : rule;
}
