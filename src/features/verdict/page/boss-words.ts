import { listDials, movedPlaces } from '../headline-words.ts';
import { resultWords } from '../result-words.ts';
import { capitalize, sayRuns } from '../wording.ts';
import { factsOf, keepsToday, type PageWording } from './page-wording.ts';

/** Three sentences that can be read out as they stand: what we did, what we found, what comes next. */
export function bossWords(wording: PageWording): [string, string, string] {
  return [sayMade(wording), sayFound(wording), sayPlan(wording)];
}

function sayMade({ view, t, formats }: PageWording): string {
  const count = view.runs.filter(({ end }) => end !== 'notRun').length;
  if (view.hours === null) return t('verdict-page:boss.made', { count });
  const hours = Math.max(1, Math.round(view.hours));
  return t('verdict-page:boss.madeIn', { runs: formats.number(count), count: hours });
}

function sayFound(wording: PageWording): string {
  const { view, t } = wording;
  const { headline } = view.verdict;
  switch (headline.kind) {
    case 'nothing-makes-a-difference':
      return t('verdict-page:boss.nothing');
    case 'real-but-too-small':
      return t('verdict-page:boss.small');
    case 'nothing-settled':
      return t('verdict-page:boss.open');
    case 'limits-clash':
      return t('verdict-page:boss.clash');
    case 'some-runs-failed':
      return t('verdict-page:boss.failed', { count: headline.values.runs });
    case 'trial-spoilt':
      return t('verdict-page:boss.spoilt');
    default: {
      const { spec, roughChange, figure } = resultWords(wording);
      const { bet } = view;
      if (spec.goal === 'target')
        return capitalize(
          t(`verdict-page:boss.target.${gainKey(view)}`, {
            settings: listDials(wording, bet.actual, movedPlaces(view), 'at'),
            result: spec.name,
            expected: figure(bet.predicted, { interval: bet.interval }),
            target: figure(spec.target ?? 0, { manner: 'fine' }),
          }),
        );
      return capitalize(
        t(`verdict-page:boss.${gainKey(view)}`, {
          settings: listDials(wording, bet.actual, movedPlaces(view), 'at'),
          result: spec.name,
          change: roughChange(bet.versusUsual, bet.gainInterval),
        }),
      );
    }
  }
}

/** A gain is spoken of as surely as it is known: the check runs have the last word. */
function gainKey({ confirmation, verdict }: PageWording['view']): 'gain' | 'maybe' | 'looked' {
  if (confirmation) return confirmation.outcome === 'held' ? 'gain' : 'looked';
  return verdict.headline.kind === 'clear-gain' ? 'gain' : 'maybe';
}

function sayPlan(wording: PageWording): string {
  const { view, t } = wording;
  const { confirmation, verdict } = view;
  if (confirmation?.outcome === 'held') return t('verdict-page:boss.held');
  if (confirmation?.outcome === 'fellShort') return t('verdict-page:boss.fellShort');
  if (confirmation) return t('verdict-page:boss.notSure', { count: confirmation.furtherPairs });
  if (factsOf(verdict.next, 'narrow-range').length > 0) return t('verdict-page:boss.narrow');
  if (factsOf(verdict.next, 'run-missing-now').length > 0) return t('verdict-page:boss.missing');
  const [again] = factsOf(verdict.next, 'measure-again');
  if (again) return t('verdict-page:boss.again', { runs: sayRuns(wording, again.refs.runs ?? []) });
  const [check] = factsOf(verdict.next, 'check-runs');
  return check && !keepsToday(view)
    ? t('verdict-page:boss.check', { count: 2 * check.values.each })
    : t('verdict-page:boss.keep');
}
