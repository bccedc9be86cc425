import { type Brief, letterAt } from '../../lib/doe/index.ts';
import type { AuditFactor } from './audit-view.ts';

/** The settings by letter, called as the machine's panel calls them. */
export function listFactors({ factors }: Pick<Brief, 'factors'>): AuditFactor[] {
  return factors.map((factor, place) => ({
    letter: letterAt(place),
    name: factor.panelName ?? factor.name,
    unit: factor.kind === 'number' ? factor.unit : '',
  }));
}
