import type { ReactNode } from 'react';
import { letterAt } from '../../../lib/doe/index.ts';
import { movedPlaces } from '../headline-words.ts';
import { resultWords } from '../result-words.ts';
import { listSettings, termName } from '../setting-words.ts';
import { sayFact } from '../verdict-words.ts';
import { capitalize, sayRuns, sentences } from '../wording.ts';
import { Numbered } from './Numbered.tsx';
import { factsOf, keepsToday, type PageWording } from './page-wording.ts';

/** "Jaw temp: Clear. Dwell: Likely." for each setting that has an effect. */
function saySure(wording: PageWording): string {
  const { view, t } = wording;
  const calls = [
    ...factsOf(view.verdict.settings, 'matters', 'real-but-small'),
    ...factsOf(view.verdict.pairs, 'matters'),
  ];
  return sentences(
    calls.map((call) =>
      t('verdict-page:trust.sure', {
        setting: termName(wording, call.refs.terms?.[0] ?? 'A'),
        sure: t(`verdict:sure.${call.values.sure}`),
      }),
    ),
  );
}

/** Settings that move although no effect of theirs is sure: where we would set the dials is not the same as what we know. */
function sayGuess(wording: PageWording): string | null {
  const { view, t } = wording;
  const known = new Set(
    [...view.verdict.settings, ...view.verdict.pairs].flatMap((call) =>
      call.kind === 'matters' || call.kind === 'real-but-small' || call.kind === 'depends-on-partner'
        ? (call.refs.factors ?? [])
        : [],
    ),
  );
  const guessed = movedPlaces(view)
    .map((place) => letterAt(place))
    .filter((letter) => !known.has(letter));
  if (guessed.length === 0 || keepsToday(view) || view.verdict.settings.length === 0) return null;
  const settings = capitalize(listSettings(wording, guessed));
  return t('verdict-page:trust.guess', { count: guessed.length, settings });
}

/** How long the check runs take, where it was said how long a run takes. */
function sayTime({ view, t }: PageWording, runs: number): string | null {
  const minutes = (view.brief.budget.minutesPerRun ?? 0) * runs;
  if (!(minutes > 0)) return null;
  return minutes < 120
    ? t('verdict-page:trust.minutes', { count: Math.round(minutes) })
    : t('verdict-page:trust.hours', { count: Math.round(minutes / 60) });
}

interface Props extends PageWording {
  /** The button that plans the check runs. */
  readonly checkRuns?: ReactNode;
}

export function CanYouTrust({ checkRuns, ...wording }: Props) {
  const { view, t } = wording;
  const { verdict, confirmation } = view;
  const said = factsOf(
    verdict.trust,
    'all-runs-in',
    'runs-missing',
    'runs-failed',
    'failed-together',
    'noise-found',
    'no-error',
    'error-judged-from-small-effects',
    'error-by-counting-theory',
    'few-counts',
    'bends',
    'odd-reading',
  );
  const failed = view.verdict.headline.kind === 'some-runs-failed' ? t('verdict-page:trust.failed') : null;
  const sure = sentences([saySure(wording), sayGuess(wording), failed]);
  const [check] = confirmation ? [] : factsOf(verdict.next, 'check-runs');
  const [odd] = factsOf(verdict.next, 'measure-again');
  const again = odd ? t('verdict-page:trust.first', { runs: sayRuns(wording, odd.refs.runs ?? []) }) : null;
  return (
    <Numbered number={3} id="can-you-trust" title={t('verdict-page:part.trust')}>
      {confirmation && sayCheckGain(wording)}
      {sure !== '' && <p>{sure}</p>}
      <p>{sentences([...said.map((fact) => sayFact(fact, wording)), again])}</p>
      {check && (
        <div className="verdict-action">
          {checkRuns}
          <p>{sentences([sayFact(check, wording), sayTime(wording, 2 * check.values.each)])}</p>
        </div>
      )}
    </Numbered>
  );
}

/** What the check runs found, where the result has a unit of its own. */
function sayCheckGain(wording: PageWording): ReactNode {
  const { view, t } = wording;
  if (!view.confirmation || view.brief.response.kind !== 'measured') return null;
  const { gain, interval } = view.confirmation;
  const amount = resultWords(wording).size(gain, interval);
  const words = t(`verdict:confirmation.${gain > 0 ? 'better' : 'worse'}`, { amount });
  return <p>{t('verdict-page:better.checked', { gain: words })}</p>;
}
