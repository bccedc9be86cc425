import type { TFunction } from 'i18next';
import { formatsFor } from '../../../i18n/format.ts';
import type { Language } from '../../../i18n/languages.ts';
import type { Fact } from '../../../lib/doe/index.ts';
import type { AnswerOf } from '../answers.schema.ts';

/** The shop's own names for what the facts speak of. */
export interface CoachNames {
  /** Of the settings in their order; empty while nobody has named one. */
  settings: readonly string[];
  result: AnswerOf<'result'>;
}

export interface CoachLine {
  tone: 'info' | 'caution';
  words: string;
}

/** A remark of the core in kind words; null for a fact that is no remark on answers. */
export function coachWords(
  fact: Fact,
  names: CoachNames,
  t: TFunction<'wizard'>,
  language: Language,
): CoachLine | null {
  const formats = formatsFor(language, 'UTC');
  const number = (value: number) => formats.number(Number(value.toPrecision(6)));
  const { result } = names;
  const lot = Number((result.lotSize ?? '').replace(',', '.')) || 1;
  const size = (value: number) => {
    const shown = number(Number((result.kind === 'rejects' ? value * lot : value).toPrecision(2)));
    return result.kind === 'measured' || !result.kind ? `${shown} ${result.unit ?? ''}`.trim() : shown;
  };
  const nameOf = (letter: string) => {
    const place = letter.charCodeAt(0) - 65;
    return names.settings[place] || t('settings.unnamed', { number: place + 1 });
  };
  const caution = (words: string): CoachLine => ({ tone: 'caution', words });
  const info = (words: string): CoachLine => ({ tone: 'info', words });

  switch (fact.kind) {
    case 'low-not-below-high':
      return caution(t('coach.lowNotBelowHigh'));
    case 'range-close-to-step': {
      const { low, high, step } = fact.values;
      return caution(t('coach.closeToStep', { low: number(low), high: number(high), step: number(step) }));
    }
    case 'end-beyond-machine': {
      const { end, value, limit } = fact.values;
      const words = { value: number(value), limit: number(limit) };
      return caution(end === 'high' ? t('coach.aboveMachine', words) : t('coach.belowMachine', words));
    }
    case 'usual-outside-range':
      return caution(t('coach.nowOutside', { now: number(fact.values.usual) }));
    case 'usual-not-halfway': {
      const { usual, middle } = fact.values;
      return info(t('coach.nowNotHalfway', { now: number(usual), middle: number(middle) }));
    }
    case 'settings-alike': {
      const [first = '', second = ''] = fact.refs.factors?.map(nameOf) ?? [];
      return caution(t('coach.alike', { first, second }));
    }
    case 'many-settings-for-runs': {
      const { settings, runs, neededApart, neededToFit, mostApart } = fact.values;
      if (mostApart === 0 || neededToFit > runs) {
        return caution(t('coach.tooManyToFit', { count: settings, needed: neededToFit, runs }));
      }
      return info(t('coach.tooManyApart', { count: settings, needed: neededApart, runs }));
    }
    case 'worth-having-below-sight':
      return caution(t('coach.worthBelowSight', { spots: size(fact.values.spots), runs: fact.values.runs }));
    case 'parts-meet-setup':
      // Fewer parts may well be added to: nothing to remark.
      if (fact.values.parts < fact.values.enoughParts) return null;
      return info(t('coach.partsEnough', { count: fact.values.enoughParts }));
    default:
      return null;
  }
}
