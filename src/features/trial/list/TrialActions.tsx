import { useTranslation } from 'react-i18next';
import { ActionMenu, type MenuAction } from '../../../components/ui/ActionMenu.tsx';
import type { PublicTrial } from '../trial.schema.ts';
import { mayPutAway } from '../trial-states.ts';

export interface TrialMoves {
  copy(trial: PublicTrial): void;
  putAway(trial: PublicTrial, away: boolean): void;
  askToDelete(trial: PublicTrial): void;
}

interface Props {
  readonly trial: PublicTrial;
  readonly moves: TrialMoves;
}

/** What can be done with a trial from the list. */
export function TrialActions({ trial, moves }: Props) {
  const { t } = useTranslation('trials');
  const isAway = trial.putAwayAt !== null;
  const actions: MenuAction[] = [
    { key: 'copy', label: t('copy'), icon: 'copy', onPick: () => moves.copy(trial) },
  ];
  if (mayPutAway(trial.state)) {
    actions.push({
      key: 'away',
      label: isAway ? t('takeOut') : t('putAway'),
      icon: isAway ? 'set-back' : 'batch',
      onPick: () => moves.putAway(trial, !isAway),
    });
  }
  if (trial.state === 'draft') {
    const onPick = () => moves.askToDelete(trial);
    actions.push({ key: 'delete', label: t('delete'), icon: 'remove', onPick });
  }
  return <ActionMenu label={t('more', { number: trial.number })} actions={actions} />;
}
