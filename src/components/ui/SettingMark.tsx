import { ChoiceMark, type Chosen } from './ChoiceMark.tsx';
import { type Level, LevelMark } from './LevelMark.tsx';

export type SettingMarkKind = Level | Chosen;

interface SettingMarkProps {
  readonly mark: SettingMarkKind;
  readonly size?: number | undefined;
  readonly label?: string | undefined;
}

/** The gauge of a number or the boxes of a choice, whichever the setting has. */
export function SettingMark({ mark, size, label }: SettingMarkProps) {
  if (mark === 'first' || mark === 'second') return <ChoiceMark chosen={mark} size={size} label={label} />;
  return <LevelMark level={mark} size={size} label={label} />;
}
