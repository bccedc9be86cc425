import { useTranslation } from 'react-i18next';
import { Icon, type IconName } from '../../../components/ui/Icon.tsx';
import type { TrialState } from '../trial-states.ts';

const icons = {
  draft: 'edit',
  'plan review': 'eye',
  ready: 'flag',
  running: 'play',
  paused: 'pause',
  held: 'stop',
  'readings in': 'gauge',
  'verdict review': 'eye',
  deciding: 'question',
  'adoption review': 'eye',
  closed: 'good',
} as const satisfies Record<TrialState, IconName>;

/** Where a trial stands, as icon and words. */
export function TrialStateMark({ state }: { readonly state: TrialState }) {
  const { t } = useTranslation('trials');
  return (
    <span className="inline-flex items-center gap-2">
      <Icon name={icons[state]} size={16} />
      {t(`state.${state}`)}
    </span>
  );
}
