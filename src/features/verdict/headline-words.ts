import type { AdviceFact, BestBet, Verdict } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { listSettings, sayValue } from './setting-words.ts';
import { capitalize, sayChance, type Wording } from './wording.ts';

type Headline<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

/** A first sentence speaks of the settings to try and of all calls, not of one fact alone. */
export interface HeadlineWording extends Wording {
  view: Wording['view'] & { bet: BestBet; verdict: Verdict; usual: (number | string)[] };
}

/** Places of the settings whose value to try is another than today's. */
export function movedPlaces({ bet, usual }: HeadlineWording['view']): number[] {
  return bet.actual.flatMap((value, place) => (value === usual[place] ? [] : [place]));
}

/** "JAW TEMP to 158 °C and DWELL to 0.9 s", for the settings at these places. */
export function listDials(
  wording: Wording,
  values: readonly (number | string)[],
  places: readonly number[],
  manner: 'to' | 'at' = 'to',
): string {
  return wording.formats.list(
    places.map((place) =>
      wording.t(`verdict:setting.${manner}`, {
        setting: wording.view.panelNames[place] ?? '',
        value: sayValue(wording, String.fromCharCode(65 + place), values[place] ?? ''),
      }),
    ),
  );
}

/** The result at usual settings, at the settings to try, and what moves. */
function gainWords(wording: HeadlineWording, manner: 'to' | 'at') {
  const { bet } = wording.view;
  const { figure, spec } = resultWords(wording);
  const { interval } = bet;
  return {
    settings: listDials(wording, bet.actual, movedPlaces(wording.view), manner),
    result: capitalize(spec.name),
    now: figure(bet.predicted - bet.versusUsual, { interval }),
    expected: figure(bet.predicted, { interval }),
  };
}

function sayTooSmall({ refs }: Headline<'real-but-too-small'>, wording: HeadlineWording): string {
  const { t, view } = wording;
  const factors = refs.factors ?? [];
  const matters = view.verdict.settings.some((call) => call.kind === 'matters');
  const values = { count: factors.length, settings: capitalize(listSettings(wording, factors)) };
  // It matters, but nothing is to be gained: today's settings stand at its good end.
  if (matters) return t('verdict:headline.alreadyBest', values);
  const worth = resultWords(wording).figure(view.brief.response.worthHaving ?? 0);
  return t('verdict:headline.tooSmall', { ...values, worth });
}

function sayClash({ values }: Headline<'limits-clash'>, wording: Wording): string {
  const { response, watch } = wording.view.brief;
  const limited = [response, ...watch].filter((spec) => spec.lower !== undefined || spec.upper !== undefined);
  return wording.t(`verdict:headline.clash.${limited.length > 1 ? 'many' : 'one'}`, {
    chance: sayChance(wording, values.probability),
  });
}

function sayNothingSettled({ values }: Headline<'nothing-settled'>, { t }: Wording): string {
  return values.runs === null
    ? t('verdict:headline.open')
    : t('verdict:headline.openRuns', { count: values.runs });
}

export const headlineSayings = {
  'clear-gain': (_: Headline<'clear-gain'>, wording: HeadlineWording) =>
    wording.t('verdict:headline.set', gainWords(wording, 'to')),
  'likely-gain': (_: Headline<'likely-gain'>, wording: HeadlineWording) =>
    wording.t('verdict:headline.try', gainWords(wording, 'at')),
  'possible-gain': (_: Headline<'possible-gain'>, wording: HeadlineWording) =>
    wording.t('verdict:headline.maybe', gainWords(wording, 'at')),
  'real-but-too-small': sayTooSmall,
  'nothing-makes-a-difference': (_: Headline<'nothing-makes-a-difference'>, { t }: Wording) =>
    t('verdict:headline.nothing'),
  'nothing-settled': sayNothingSettled,
  'limits-clash': sayClash,
  'some-runs-failed': ({ values }: Headline<'some-runs-failed'>, { t }: Wording) =>
    t('verdict:headline.failed', { count: values.runs }),
  'trial-spoilt': ({ values }: Headline<'trial-spoilt'>, { t }: Wording) =>
    t('verdict:headline.spoilt', { count: values.missing, planned: values.planned }),
};
