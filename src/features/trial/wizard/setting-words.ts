import type { SettingEnd } from '../answer-choices.ts';
import type { SettingAnswer } from '../answers.schema.ts';

/** The name of a setting as the panel shows it, else as it was typed. */
export function panelNameOf({ panelName, name }: SettingAnswer): string {
  return panelName?.trim() || name?.trim() || '';
}

function withUnit(typed: string | undefined, unit: string | undefined): string | null {
  const value = typed?.trim() ?? '';
  if (value === '') return null;
  return /^[\d.,+\-\u2212]+$/.test(value) && unit?.trim() ? `${value} ${unit.trim()}` : value;
}

/** The value at one end as it was typed, with its unit; a choice's own name. Null where nothing was typed. */
export function endValueOf(setting: SettingAnswer, end: SettingEnd): string | null {
  return withUnit(setting[end], setting.kind === 'number' ? setting.unit : undefined);
}

/** What a setting is set to on a normal day; null where nobody has said. */
export function usualValueOf(setting: SettingAnswer): string | null {
  if (setting.kind === 'number') return withUnit(setting.usual, setting.unit);
  return setting.usual ? endValueOf(setting, setting.usual) : null;
}

/** The settings of a mix, each with its value as the panel shows them. */
export function mixParts(
  ends: Readonly<Record<string, SettingEnd>>,
  settings: readonly SettingAnswer[],
): string[] {
  return settings.flatMap((setting) => {
    const end = ends[setting.id];
    if (!end) return [];
    return `${panelNameOf(setting)} ${endValueOf(setting, end) ?? ''}`.trim();
  });
}
