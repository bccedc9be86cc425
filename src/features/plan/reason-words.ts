import type { Fact } from '../../lib/doe/index.ts';
import type { FactSpeech } from './fact-speech.ts';

/** Why a plan is proposed, in words; null for a fact that is no such reason. */
export function reasonWords(fact: Fact, speech: FactSpeech): string | null {
  const { t, number, size, timesInTen } = speech;
  switch (fact.kind) {
    case 'cheapest-with-power':
      return t('reason.cheapestWithPower', { times: timesInTen(fact.values.power) });
    case 'most-power-within-limits':
      return t('reason.mostPower', { times: timesInTen(fact.values.power) });
    case 'cheapest-with-own-error':
      return t('reason.cheapestWithOwnError');
    case 'screen-first':
      return t('reason.screenFirst');
    case 'fits-the-limits':
      return t('reason.fitsTheLimits');
    case 'quicker':
      return t('reason.quicker', { count: fact.values.fewerRuns });
    case 'surer': {
      const { size: own, recommendedSize } = fact.values;
      if (speech.brief.noise === null && speech.brief.response.kind === 'measured') {
        return t('reason.surerUnknown');
      }
      return t('reason.surer', { size: size(own), other: size(recommendedSize) });
    }
    case 'main-effects-apart':
      return t('reason.settingsApart');
    case 'pairs-apart':
      return t('reason.pairsApart');
    case 'shows-a-bend':
      return t('reason.showsABend', { count: fact.values.middles });
    case 'judges-hard-settings':
      return t('reason.judgesHard', { settings: speech.settings(fact.refs) });
    case 'judges-spread':
      return t('reason.judgesSpread', { ratio: number(Number(fact.values.ratio.toPrecision(2))) });
    default:
      return null;
  }
}
