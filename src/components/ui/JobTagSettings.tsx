import { SettingMark, type SettingMarkKind } from './SettingMark.tsx';

export interface TagSetting {
  /** As the machine's panel shows it. */
  readonly name: string;
  /** As the panel takes it: a formatted number, or the name of the choice. */
  readonly value: string;
  readonly unit?: string | undefined;
  /** Left out for a value between the levels, such as one that was found rather than planned. */
  readonly mark?: SettingMarkKind | undefined;
}

interface JobTagSettingsProps {
  readonly settings: readonly TagSetting[];
}

function isChoice({ mark }: TagSetting): boolean {
  return mark === 'first' || mark === 'second';
}

/** Name, value and mark of each setting, one line each. A figure is never shortened; a long name gives way to it. */
export function JobTagSettings({ settings }: JobTagSettingsProps) {
  return (
    <dl className="job-tag-settings">
      {settings.map((setting) => (
        <div key={setting.name} className="job-tag-setting">
          <dt className="job-tag-name" translate="no">
            {setting.name}
          </dt>
          <dd className={isChoice(setting) ? 'job-tag-value job-tag-choice' : 'job-tag-value'}>
            <span className="job-tag-figure">
              {setting.value}
              {setting.unit && <span className="job-tag-unit"> {setting.unit}</span>}
            </span>
            <span className="job-tag-mark">{setting.mark && <SettingMark mark={setting.mark} />}</span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
