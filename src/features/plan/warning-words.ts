import type { Fact } from '../../lib/doe/index.ts';
import { type FactSpeech, roundForPromise } from './fact-speech.ts';

/** What a plan cannot do, and what its promises rest on, in kind words; null for a fact that is no such warning. */
export function warningWords(fact: Fact, speech: FactSpeech): string | null {
  return tieWords(fact, speech) ?? errorWords(fact, speech) ?? ruleWords(fact, speech);
}

function tieWords(fact: Fact, { t, brief, terms, settings }: FactSpeech): string | null {
  const split = brief.blocks?.kind ?? 'batch';
  switch (fact.kind) {
    case 'main-effects-tied-to-pairs':
      return t('warning.settingsTied', { settings: terms(fact.refs) });
    case 'pairs-tied':
      return t('warning.pairsTied', { pairs: terms(fact.refs) });
    case 'hidden-by-blocks':
      return t(`warning.hidden.${split}`, { terms: terms(fact.refs) });
    case 'block-too-small': {
      const { runsEach, needed } = fact.values;
      return t(`warning.tooSmall.${split}`, { runs: runsEach, needed });
    }
    case 'hard-setting-not-judged':
      return t('warning.hardNotJudged', { settings: settings(fact.refs) });
    case 'hard-settings-shuffled':
      return t('warning.hardShuffled', { settings: settings(fact.refs) });
    case 'one-at-a-time-would-do':
      return t('warning.oneAtATime');
    default:
      return null;
  }
}

function errorWords(fact: Fact, speech: FactSpeech): string | null {
  const { t, number, size } = speech;
  switch (fact.kind) {
    case 'error-from-small-effects':
      return t('warning.fewRepeats', { count: fact.values.assumedActive });
    case 'no-error-estimate':
      return t('warning.noRepeats');
    case 'setup-assumed':
      return t('warning.setupAssumed', { size: size(fact.values.setup) });
    case 'noise-unknown':
      return t('warning.noiseUnknown');
    case 'counting-noise-only':
      return t('warning.countingOnly');
    case 'few-rejects': {
      const { expected, lotSize, lotNeeded } = fact.values;
      const result = speech.result(fact.refs);
      if (lotNeeded === null) return t('warning.noneToday', { result });
      const about = number(roundForPromise(expected));
      return t('warning.fewRejects', { result, about, lot: number(lotSize), needed: number(lotNeeded) });
    }
    case 'short-term-spread-only':
      return t('warning.partsInARow');
    default:
      return null;
  }
}

function ruleWords(fact: Fact, { t, dial, terms, settings, number }: FactSpeech): string | null {
  switch (fact.kind) {
    case 'bend-at-usual-choices':
      return t('warning.middleAtUsual', { settings: settings(fact.refs) });
    case 'bend-not-shown':
      return t('warning.noMiddle');
    case 'pair-emptied-by-rule':
      return t('warning.pairEmptied', { pair: terms(fact.refs) });
    case 'narrow-a-range-first': {
      const { low, high } = fact.values;
      const [letter = 'A'] = fact.refs.factors ?? [];
      return t('warning.narrow', {
        setting: settings(fact.refs),
        low: number(low),
        high: dial(letter, high),
      });
    }
    case 'uneven-corners':
      return t('warning.uneven', { terms: terms(fact.refs) });
    case 'middle-touches-rule':
      return t('warning.middleTouches', { settings: settings(fact.refs) });
    default:
      return null;
  }
}
