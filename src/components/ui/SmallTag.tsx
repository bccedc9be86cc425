import { Paper } from './Paper.tsx';
import { SettingMark, type SettingMarkKind } from './SettingMark.tsx';

export interface SmallTagSetting {
  readonly name: string;
  readonly mark: SettingMarkKind;
}

interface SmallTagProps {
  readonly number: string;
  /** The whole tag in words for a screen reader, such as "Run 2: Jaw temp high, Film Supplier A". */
  readonly name: string;
  readonly settings: readonly SmallTagSetting[];
}

/** A run of a plan that is not started: its number and where each setting stands. For racks on the wizard's cards. */
export function SmallTag({ number, name, settings }: SmallTagProps) {
  return (
    <div className="small-tag" role="img" aria-label={name}>
      <Paper />
      <span className="small-tag-number">{number}</span>
      {settings.map((setting) => (
        <span key={setting.name} className="small-tag-setting">
          <span className="small-tag-name" translate="no">
            {setting.name}
          </span>
          <SettingMark mark={setting.mark} size={14} />
        </span>
      ))}
    </div>
  );
}
