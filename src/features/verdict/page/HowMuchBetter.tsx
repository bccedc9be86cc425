import type { ReactNode } from 'react';
import type { Outlook, ResponseSpec } from '../../../lib/doe/index.ts';
import { resultWords } from '../result-words.ts';
import { capitalize, sayChance, sentences } from '../wording.ts';
import { moneyWords } from './money-words.ts';
import { Numbered } from './Numbered.tsx';
import { keepsToday, type PageWording } from './page-wording.ts';

function Figure({ label, note, children }: { label: string; note?: string; children: ReactNode }) {
  return (
    <div className="verdict-figure">
      <dt>{label}</dt>
      <dd>
        {children}
        {note && <span className="verdict-figure-note">{note}</span>}
      </dd>
    </div>
  );
}

/** What the limits are called, and their figures; null: there are none. */
export function limitWords(wording: PageWording, spec: ResponseSpec, result = 0): [string, string] | null {
  const { t } = wording;
  const { figure, range } = resultWords(wording, result);
  const { lower, upper } = spec;
  if (lower !== undefined && upper !== undefined)
    return [t('verdict-page:better.limit.between'), range([lower, upper], 'fine')];
  if (lower !== undefined) return [t('verdict-page:better.limit.atLeast'), figure(lower)];
  return upper === undefined ? null : [t('verdict-page:better.limit.atMost'), figure(upper)];
}

/** A watched result at the settings to try, and whether its limit holds there. */
function sayWatched(wording: PageWording, outlook: Outlook): string {
  const { t } = wording;
  const { figure, range, spec } = resultWords(wording, outlook.result);
  const { predicted, interval, versusUsual, gainInterval, limitProbability } = outlook;
  const result = capitalize(spec.name);
  const limit = limitWords(wording, spec, outlook.result);
  const moves = gainInterval[0] > 0 || gainInterval[1] < 0;
  return sentences([
    moves
      ? t('verdict-page:better.watched.moves', {
          result,
          now: figure(predicted - versusUsual, { interval }),
          expected: figure(predicted, { interval }),
          range: range(interval),
        })
      : t('verdict-page:better.watched.same', { result, figure: figure(predicted, { interval }) }),
    limit && limitProbability !== null
      ? t('verdict-page:better.watched.holds', {
          result,
          limit: limit[1],
          chance: sayChance(wording, limitProbability),
        })
      : null,
  ]);
}

export function HowMuchBetter(wording: PageWording) {
  const { view, t } = wording;
  const { bet, brief } = view;
  const { figure, range, change } = resultWords(wording);
  const { interval } = bet;
  const keeps = keepsToday(view);
  const limit = limitWords(wording, brief.response);
  const { goal, target: aim } = brief.response;
  const target = goal === 'target' && aim !== undefined ? figure(aim, { manner: 'fine' }) : null;
  const { limitProbability, partInterval } = bet.main;
  return (
    <Numbered number={2} id="how-much-better" title={t('verdict-page:part.better')}>
      <dl className="verdict-figures">
        <Figure label={t('verdict-page:better.now')}>
          {figure(bet.predicted - bet.versusUsual, { interval })}
        </Figure>
        {!keeps && (
          <Figure label={t('verdict-page:better.expect')} note={range(interval)}>
            {figure(bet.predicted, { interval })}
          </Figure>
        )}
        {!keeps && partInterval && (
          <Figure label={t('verdict-page:better.single')}>{range(partInterval)}</Figure>
        )}
        {target && <Figure label={t('verdict-page:better.target')}>{target}</Figure>}
        {limit && <Figure label={limit[0]}>{limit[1]}</Figure>}
      </dl>
      {keeps ? (
        <p>{t('verdict-page:better.none')}</p>
      ) : (
        <>
          <p>
            {sentences([
              t('verdict-page:better.change', { change: change(bet.versusUsual, bet.gainInterval) }),
              limitProbability === null
                ? null
                : t('verdict-page:better.holds', { chance: sayChance(wording, limitProbability) }),
              moneyWords(wording),
            ])}
          </p>
          {bet.watched.map((outlook) => (
            <p key={outlook.result}>{sayWatched(wording, outlook)}</p>
          ))}
        </>
      )}
    </Numbered>
  );
}
