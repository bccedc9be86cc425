import { useTranslation } from 'react-i18next';
import type { Formats } from '../../../i18n/format.ts';
import { type ListTrials, type PublicTrial, trialSorts } from '../trial.schema.ts';
import { trialAddress } from '../trial-address.ts';
import { sortedTrialsAddress } from '../trials-address.ts';
import { TrialActions, type TrialMoves } from './TrialActions.tsx';
import { TrialStateMark } from './TrialStateMark.tsx';

interface Props {
  readonly trials: readonly PublicTrial[];
  readonly list: ListTrials;
  readonly formats: Formats;
  readonly moves: TrialMoves | null;
}

/** The trials on a phone: one below the other, the whole name in view. */
export function TrialRows({ trials, list, formats, moves }: Props) {
  const { t } = useTranslation('trials');
  if (trials.length === 0) return <p className="sheet text-steel">{t('noneFound')}</p>;
  return (
    <>
      <nav className="mb-2 flex flex-wrap items-center gap-x-4" aria-label={t('sortBy')}>
        <span className="text-steel">{t('sortBy')}</span>
        {trialSorts.map((sort) => (
          <a
            key={sort}
            className="inline-flex min-h-12 items-center"
            href={sortedTrialsAddress(list, sort)}
            aria-current={list.sort === sort || undefined}
          >
            {t(`column.${sort}`)}
          </a>
        ))}
      </nav>
      <ul className="grid gap-3">
        {trials.map((trial) => (
          <li key={trial.id} className="sheet grid gap-1">
            <p className="text-section font-semibold">
              <a className="inline-flex min-h-12 items-center wrap-anywhere" href={trialAddress(trial)}>
                {trial.title || t('untitled')}
              </a>
            </p>
            <p>
              <TrialStateMark state={trial.state} />
            </p>
            <p className="text-steel">
              {[t('numbered', { number: trial.number }), trial.machine, trial.ownerName]
                .filter((part) => part !== '')
                .join(' · ')}
            </p>
            <div className="flex flex-wrap items-center justify-between gap-2">
              <time className="figures text-steel" dateTime={new Date(trial.updatedAt).toISOString()}>
                {formats.dateTime(trial.updatedAt)}
              </time>
              {moves && <TrialActions trial={trial} moves={moves} />}
            </div>
          </li>
        ))}
      </ul>
    </>
  );
}
