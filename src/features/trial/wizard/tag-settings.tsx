import type { TagSetting } from '../../../components/ui/JobTag.tsx';
import type { Formats } from '../../../i18n/format.ts';
import type { SettingAnswer } from '../answers.schema.ts';
import type { PublicPlan } from '../plan.schema.ts';
import { settingMarkOf } from '../setting-mark.ts';
import { panelNameOf } from './setting-words.ts';

/** What stands on the tag of one run of a plan. */
export function tagSettingsOf(
  plan: PublicPlan,
  order: number,
  settings: readonly SettingAnswer[],
  { number }: Pick<Formats, 'number'>,
): TagSetting[] {
  const run = plan.runs.find((each) => each.order === order);
  if (!run) return [];
  return plan.settingIds.flatMap((id, place) => {
    const setting = settings.find((each) => each.id === id);
    const value = run.planned[place];
    if (!setting || value === undefined) return [];
    const unit = setting.kind === 'number' ? setting.unit?.trim() : undefined;
    return {
      name: panelNameOf(setting),
      value: typeof value === 'number' ? number(value) : value,
      ...(unit ? { unit } : {}),
      mark: settingMarkOf(setting, run.coded[place] ?? 0),
    };
  });
}
