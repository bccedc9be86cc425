import { type Hazard, HazardSign } from '../../../components/ui/HazardSign.tsx';
import type { HazardName } from '../../trial/answer-choices.ts';
import { listDials, movedPlaces } from '../headline-words.ts';
import { resultWords } from '../result-words.ts';
import { capitalize, sentences } from '../wording.ts';
import { Numbered } from './Numbered.tsx';
import { keepsToday, type PageWording } from './page-wording.ts';

export const hazardSigns: Record<HazardName, Hazard> = {
  hotParts: 'hot',
  pressure: 'pressure',
  movingParts: 'moving',
  chemicals: 'chemicals',
  electricity: 'electricity',
  dustOrFumes: 'dust',
  lifting: 'lifting',
  loudNoise: 'noise',
};

/** When to go back: a limit of any result is passed, or the result gets worse than today. */
function sayTriggers(wording: PageWording): string[] {
  const { view, t } = wording;
  const triggers = [view.brief.response, ...view.brief.watch].flatMap((spec, place) => {
    const { figure } = resultWords(wording, place);
    const result = spec.name;
    return [
      ...(spec.lower === undefined
        ? []
        : [t('verdict-page:wrong.under', { result, limit: figure(spec.lower) })]),
      ...(spec.upper === undefined
        ? []
        : [t('verdict-page:wrong.over', { result, limit: figure(spec.upper) })]),
    ];
  });
  if (triggers.length > 0) return triggers;
  const { figure, spec } = resultWords(wording);
  const now = figure(view.bet.predicted - view.bet.versusUsual, { interval: view.bet.interval });
  if (spec.goal !== 'target') return [t('verdict-page:wrong.worse', { result: spec.name, now })];
  const target = figure(spec.target ?? 0, { manner: 'fine' });
  return [t('verdict-page:wrong.further', { result: spec.name, target, now })];
}

/** The hazards that were ticked, each with its cautions in place. */
export function Hazards({ view, t }: PageWording) {
  if (view.hazards.length === 0) return null;
  return (
    <ul className="verdict-hazards">
      {view.hazards.map(({ hazard, cautions, protects }) => (
        <li key={hazard}>
          <HazardSign hazard={hazardSigns[hazard]} size={28} />
          <span>
            <strong>{t(`safety:hazard.${hazard}`)}</strong>
            {[...cautions.map((caution) => t(`safety:caution.${caution}`)), protects]
              .filter((words) => words !== '')
              .map((words) => ` · ${words}`)
              .join('')}
          </span>
        </li>
      ))}
    </ul>
  );
}

export function CallLines({ view, t }: PageWording) {
  return (
    <ul className="verdict-calls">
      {view.call.map(({ when, whom }) => (
        <li key={`${when} ${whom}`}>{capitalize(t('verdict-page:wrong.call', { when, whom }))}</li>
      ))}
    </ul>
  );
}

export function IfItGoesWrong(wording: PageWording) {
  const { view, t } = wording;
  // Where nothing is to be moved, all settings are those to go back to.
  const moved = keepsToday(view) ? [] : movedPlaces(view);
  const places = moved.length > 0 ? moved : view.usual.map((_, place) => place);
  const rules = [...view.stop.picked.map((rule) => t(`safety:stop.${rule}`)), view.stop.own].filter(
    (words) => words !== '',
  );
  return (
    <Numbered number={4} id="if-it-goes-wrong" title={t('verdict-page:part.wrong')}>
      <div className="verdict-back">
        <p>
          <strong>
            {t('verdict-page:wrong.back', { settings: listDials(wording, view.usual, places, 'at') })}
          </strong>{' '}
          {sentences(sayTriggers(wording))}
        </p>
        {rules.length > 0 && <p>{t('verdict-page:wrong.stop', { rules: rules.join('; ') })}</p>}
        <Hazards {...wording} />
        <CallLines {...wording} />
        <p>{t('verdict-page:wrong.first')}</p>
      </div>
    </Numbered>
  );
}
