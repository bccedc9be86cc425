/** Where a number stands in its window, or which of its two names a choice has. */
export type SettingMarkName = 'low' | 'middle' | 'high' | 'first' | 'second';

/** The mark of a planned setting, for tags and racks. @param coded -1 low, 0 middle, +1 high */
export function settingMarkOf({ kind }: { kind: 'number' | 'choice' }, coded: number): SettingMarkName {
  if (kind === 'choice') return coded > 0 ? 'second' : 'first';
  if (coded === 0) return 'middle';
  return coded > 0 ? 'high' : 'low';
}
