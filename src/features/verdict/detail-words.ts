import type { AdviceFact } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { roundingStep, roundTo } from './rounding.ts';
import { changeName, listTerms, settingAt, termName } from './setting-words.ts';
import { capitalize, sentences, type Wording } from './wording.ts';

type Detail<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

function sayLikeliest({ refs }: Detail<'likeliest-of-tied'>, wording: Wording): string {
  const [named = ''] = refs.terms ?? [];
  return wording.t('verdict:detail.likeliest', {
    terms: listTerms(wording, refs.terms ?? []),
    named: termName(wording, named),
  });
}

/** The four corners of a pair as two sentences, one for each side of the second setting. */
function sayCorners({ values, refs }: Detail<'pair-corners'>, wording: Wording): string {
  const [first = '', second = ''] = refs.factors ?? [];
  const { figure } = resultWords(wording, refs.results?.[0]);
  const all = [values.lowLow, values.highLow, values.lowHigh, values.highHigh];
  const interval = [Math.min(...all), Math.max(...all)] as const;
  const side = (level: -1 | 1, from: number, to: number) =>
    wording.t('verdict:detail.corners', {
      partner: settingAt(wording, second, level),
      setting: changeName(wording, first),
      from: figure(from, { interval, manner: 'fine' }),
      to: figure(to, { interval, manner: 'fine' }),
    });
  return sentences([side(-1, values.lowLow, values.highLow), side(1, values.lowHigh, values.highHigh)]);
}

function sayWouldSettle({ values, refs }: Detail<'would-settle'>, wording: Wording): string {
  const [term = ''] = refs.terms ?? [];
  return wording.t('verdict:detail.settle', {
    name: capitalize(termName(wording, term)),
    count: values.runs,
  });
}

function sayWatchedMoves({ values, refs }: Detail<'watched-moves'>, wording: Wording): string {
  const result = refs.results?.[0] ?? 1;
  const words = resultWords(wording, result);
  return wording.t('verdict:detail.watched', {
    result: capitalize(words.spec.name),
    change: words.change(values.change, values.interval),
    setting: listTerms(wording, refs.terms ?? []),
    sure: wording.t(`verdict:sure.${values.sure}`),
  });
}

/** "1.8" of a ratio of spreads, always above one: it is said from the calmer side. */
export function sayTimes({ formats }: Wording, ratio: number): string {
  const times = ratio >= 1 ? ratio : 1 / ratio;
  const rounded = roundTo(times, roundingStep(times, null, 'fine'));
  return formats.number(rounded.value, rounded.digits);
}

function saySteadier({ values, refs }: Detail<'steadier-matters'>, wording: Wording): string {
  const [term = ''] = refs.terms ?? [];
  const times = sayTimes(wording, values.ratio);
  const sure = wording.t(`verdict:sure.${values.sure}`);
  if (term.length > 1)
    return wording.t('verdict:detail.steadierPair', { name: termName(wording, term), times, sure });
  const calm = values.ratio > 1 ? -1 : 1;
  return wording.t('verdict:detail.steadier', {
    calm: settingAt(wording, term, calm),
    wild: settingAt(wording, term, -calm),
    times,
    sure,
  });
}

export const detailSayings = {
  'likeliest-of-tied': sayLikeliest,
  'pair-corners': sayCorners,
  'would-settle': sayWouldSettle,
  'watched-moves': sayWatchedMoves,
  'steadier-matters': saySteadier,
};
