import type { AdviceFact } from '../../lib/doe/index.ts';
import { bendSayings } from './bend-words.ts';
import { resultWords, specOf } from './result-words.ts';
import { settingAt } from './setting-words.ts';
import { sayRuns, type Wording } from './wording.ts';

type Trust<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

/** Readings on a normal day lie within about two standard deviations. */
const UP_OR_DOWN = 2;

function sayFailed({ values, refs }: Trust<'runs-failed'>, wording: Wording): string {
  const key = values.end === 'failed' ? 'failed' : 'beyondGauge';
  const runs = sayRuns(wording, refs.runs ?? []);
  return wording.t(`verdict:trust.${key}`, { count: values.runs, runs });
}

function sayFailedTogether({ values, refs }: Trust<'failed-together'>, wording: Wording): string {
  const settings = (refs.factors ?? []).map((letter, index) =>
    settingAt(wording, letter, values.levels[index] ?? 1),
  );
  return wording.t('verdict:trust.failedTogether', { settings: wording.formats.list(settings) });
}

function sayNoise({ values }: Trust<'noise-found'>, wording: Wording): string {
  const { t } = wording;
  // Counts are judged on a scale of their own, where a spread has no unit.
  if (specOf(wording, 0).kind !== 'measured') return t('verdict:trust.noise.counted');
  const { size } = resultWords(wording);
  const amount = size(UP_OR_DOWN * values.sd, null);
  if (values.expected === null) return t('verdict:trust.noise.nothing-said', { amount });
  const expected = size(UP_OR_DOWN * values.expected, null);
  return t(`verdict:trust.noise.${values.compared}`, { amount, expected });
}

function sayOdd({ values, refs }: Trust<'odd-reading'>, wording: Wording): string {
  const { spec, figure, range } = resultWords(wording);
  const interval = [values.low, values.high] as const;
  // A reading of rejects is a count; what is expected is a share.
  const reading = spec.kind === 'rejects' ? values.reading / (spec.lotSize ?? 1) : values.reading;
  return wording.t('verdict:trust.odd', {
    run: sayRuns(wording, refs.runs ?? []),
    reading: figure(reading, { interval, manner: 'fine' }),
    range: range(interval, 'fine'),
  });
}

function sayDrift({ values }: Trust<'drift-seen'>, wording: Wording): string {
  const change = resultWords(wording).change(values.change, values.interval);
  return wording.t(`verdict:trust.drift.${values.change < 0 ? 'down' : 'up'}`, { change });
}

function sayFewCounts({ values }: Trust<'few-counts'>, { t, formats }: Wording): string {
  return values.lotNeeded === null
    ? t('verdict:trust.fewCounts.none')
    : t('verdict:trust.fewCounts.lot', { lot: formats.number(values.lotNeeded) });
}

export const trustSayings = {
  'all-runs-in': ({ values }: Trust<'all-runs-in'>, { t }: Wording) =>
    t('verdict:trust.allIn', { count: values.runs }),
  'runs-missing': ({ values }: Trust<'runs-missing'>, { t }: Wording) =>
    t('verdict:trust.missing', { count: values.missing, planned: values.planned }),
  'runs-failed': sayFailed,
  'failed-together': sayFailedTogether,
  'noise-found': sayNoise,
  'error-judged-from-small-effects': ({ values }: Trust<'error-judged-from-small-effects'>, { t }: Wording) =>
    t('verdict:trust.smallChanges', { count: values.contrasts }),
  'error-by-counting-theory': (_: Trust<'error-by-counting-theory'>, { t }: Wording) =>
    t('verdict:trust.countingTheory'),
  'no-error': ({ values }: Trust<'no-error'>, { t }: Wording) => t(`verdict:trust.noError.${values.because}`),
  'odd-reading': sayOdd,
  'drift-seen': sayDrift,
  'no-drift-seen': (_: Trust<'no-drift-seen'>, { t }: Wording) => t('verdict:trust.drift.none'),
  'drift-not-judged': (_: Trust<'drift-not-judged'>, { t }: Wording) => t('verdict:trust.drift.open'),
  ...bendSayings,
  'few-counts': sayFewCounts,
  'other-scale-fits-better': (_: Trust<'other-scale-fits-better'>, { t }: Wording) =>
    t('verdict:trust.scale'),
};
