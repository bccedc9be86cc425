import { SettingTrack } from '../../../components/ui/SettingTrack.tsx';
import type { NumberFactor } from '../../../lib/doe/index.ts';
import { letterAt } from '../../../lib/doe/index.ts';
import { movedPlaces } from '../headline-words.ts';
import { sayRange, sayValue } from '../setting-words.ts';
import { sayFact } from '../verdict-words.ts';
import { Numbered } from './Numbered.tsx';
import { factsOf, keepsToday, type PageWording } from './page-wording.ts';

interface MovedProps {
  readonly wording: PageWording;
  readonly place: number;
}

/** A setting that moves: its track with today's pin and the new flag, or its two names. */
function Moved({ wording, place }: MovedProps) {
  const { view, t } = wording;
  const factor = view.brief.factors[place];
  const [letter, setting] = [letterAt(place), view.panelNames[place] ?? ''];
  const [next, now] = [view.bet.actual[place] ?? '', view.usual[place] ?? ''];
  const words = { setting, next: sayValue(wording, letter, next), now: sayValue(wording, letter, now) };
  if (factor?.kind !== 'number' || typeof next !== 'number' || typeof now !== 'number')
    return <p className="verdict-choice">{t('verdict-page:set.choice', words)}</p>;
  return (
    <div>
      <p>
        <strong translate="no">{setting}</strong> <span className="text-steel">{factor.unit}</span>
      </p>
      <SettingTrack
        {...pointsOf(wording, factor, now, next)}
        label={t('verdict-page:set.track', { ...words, range: sayRange(wording, factor) })}
      />
    </div>
  );
}

function pointsOf({ t, formats }: PageWording, factor: NumberFactor, now: number, next: number) {
  const point = (value: number) => ({ value, label: formats.number(value, 6) });
  return {
    low: point(factor.low),
    high: point(factor.high),
    now: { value: now, label: t('verdict-page:set.now', { value: formats.number(now, 6) }) },
    next: point(next),
    min: factor.min === undefined ? undefined : point(factor.min),
    max: factor.max === undefined ? undefined : point(factor.max),
  };
}

export function WhatToSet(wording: PageWording) {
  const { view, t } = wording;
  const keeps = keepsToday(view);
  const moved = keeps ? [] : movedPlaces(view);
  const staying = view.usual.flatMap((_, place) => (moved.includes(place) ? [] : [place]));
  const isNumber = (place: number) => view.brief.factors[place]?.kind === 'number';
  const why = factsOf(view.bet.reasons, 'was-run', 'was-not-run', 'only-what-was-run', 'away-from-failures');
  return (
    <Numbered number={1} id="what-to-set" title={t('verdict-page:part.set')}>
      {keeps && <p>{view.bet.keepToday ? t('verdict-page:set.keep') : t('verdict-page:set.back')}</p>}
      {moved.some(isNumber) && (
        <div className="verdict-tracks">
          {moved.filter(isNumber).map((place) => (
            <Moved key={place} wording={wording} place={place} />
          ))}
        </div>
      )}
      {moved
        .filter((place) => !isNumber(place))
        .map((place) => (
          <Moved key={place} wording={wording} place={place} />
        ))}
      {staying.length > 0 && (
        <p>
          {staying
            .map((place) =>
              t('verdict-page:set.stays', {
                setting: view.panelNames[place] ?? '',
                value: sayValue(wording, letterAt(place), view.usual[place] ?? ''),
              }),
            )
            .join(' ')}
        </p>
      )}
      {!keeps && <p className="text-steel">{why.map((fact) => sayFact(fact, wording)).join(' ')}</p>}
    </Numbered>
  );
}
