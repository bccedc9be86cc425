import type { AdviceFact } from '../../lib/doe/index.ts';
import { listSettings, listTerms, sayEnd, settingName } from './setting-words.ts';
import { sayChance, sayRuns, sentences, type Wording } from './wording.ts';

type Next<Kind extends AdviceFact['kind']> = Extract<AdviceFact, { kind: Kind }>;

function sayCheckRuns({ values }: Next<'check-runs'>, wording: Wording): string {
  const { t, formats } = wording;
  return sentences([
    t('verdict:next.check', { total: formats.number(2 * values.each), each: formats.number(values.each) }),
    t('verdict:next.checkPower', { chance: sayChance(wording, values.power) }),
  ]);
}

function sayNarrow({ refs }: Next<'narrow-range'>, wording: Wording): string {
  const letters = refs.factors ?? [];
  return letters.length === 0
    ? wording.t('verdict:next.narrowAny')
    : wording.t('verdict:next.narrow', { settings: listSettings(wording, letters) });
}

function sayMoveWindow({ values, refs }: Next<'move-window'>, wording: Wording): string {
  const [letter = ''] = refs.factors ?? [];
  return wording.t(`verdict:next.${values.direction === 1 ? 'up' : 'down'}`, {
    setting: settingName(wording, letter),
    end: sayEnd(wording, letter, values.direction),
  });
}

export const nextSayings = {
  'check-runs': sayCheckRuns,
  'keep-today': (_: Next<'keep-today'>, { t }: Wording) => t('verdict:next.keep'),
  'run-missing-now': ({ values }: Next<'run-missing-now'>, { t }: Wording) =>
    t('verdict:next.missing', { count: values.runs }),
  'measure-again': ({ refs }: Next<'measure-again'>, wording: Wording) =>
    wording.t('verdict:next.again', { runs: sayRuns(wording, refs.runs ?? []) }),
  'narrow-range': sayNarrow,
  untie: ({ refs }: Next<'untie'>, wording: Wording) =>
    wording.t('verdict:next.untie', {
      terms: listTerms(wording, refs.terms ?? []),
    }),
  'follow-the-curve': ({ refs }: Next<'follow-the-curve'>, wording: Wording) =>
    wording.t('verdict:next.curve', { settings: listSettings(wording, refs.factors ?? []) }),
  'move-window': sayMoveWindow,
  'repeat-for-certainty': ({ values }: Next<'repeat-for-certainty'>, { t }: Wording) =>
    t('verdict:next.repeat', { count: values.runs }),
};

export const reasonSayings = {
  'was-run': ({ values }: Next<'was-run'>, { t }: Wording) =>
    t('verdict:reason.run', { count: values.readings }),
  'was-not-run': (_: Next<'was-not-run'>, { t }: Wording) => t('verdict:reason.notRun'),
  'stays-as-it-is': ({ refs }: Next<'stays-as-it-is'>, wording: Wording) =>
    wording.t('verdict:reason.stays', {
      count: refs.factors?.length ?? 1,
      settings: listSettings(wording, refs.factors ?? []),
    }),
  'only-what-was-run': (_: Next<'only-what-was-run'>, { t }: Wording) => t('verdict:reason.onlyRun'),
  'away-from-failures': (_: Next<'away-from-failures'>, { t }: Wording) => t('verdict:reason.away'),
  'nothing-worth-changing': ({ values }: Next<'nothing-worth-changing'>, wording: Wording) =>
    wording.t('verdict:reason.nothing', { chance: sayChance(wording, values.chance) }),
};
