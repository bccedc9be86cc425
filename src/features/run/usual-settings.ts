import type { Brief } from '../../lib/doe/index.ts';
import type { SettingValue } from './run.ts';

/** Each setting as the panel calls it, with the value that it usually stands at. */
export function usualSettings({ factors }: Pick<Brief, 'factors'>): { name: string; value: SettingValue }[] {
  return factors.map((factor) => ({
    name: factor.panelName ?? factor.name,
    value: factor.kind === 'number' ? factor.usual : factor[factor.usual],
  }));
}

/** The same in one line, as a text says it. Figures are in plain digits, alike in every language. */
export function listUsualSettings(brief: Pick<Brief, 'factors'>): string {
  return usualSettings(brief)
    .map(({ name, value }) => `${name} ${value}`)
    .join(', ');
}
