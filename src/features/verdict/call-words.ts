import type { AdviceFact } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { changeName, isChoice, listTerms, sayEnd, settingAt, settingName } from './setting-words.ts';
import { capitalize, sentences, type Wording } from './wording.ts';

export const callKinds = ['matters', 'real-but-small', 'no-real-difference', 'cant-tell'] as const;
type CallFact = Extract<AdviceFact, { kind: (typeof callKinds)[number] }>;
type DependsFact = Extract<AdviceFact, { kind: 'depends-on-partner' }>;

/** The words of one row of changes. */
export interface CallWords {
  name: string;
  /** The change and its range; empty where nothing was estimated. */
  size: string;
  call: string;
}

/** A setting or a pair as it was judged. */
export function sayCall(fact: CallFact, wording: Wording): CallWords {
  const { t } = wording;
  const [term = '', ...tied] = fact.refs.terms ?? [];
  const names =
    tied.length === 0
      ? changeName(wording, term)
      : t('verdict:setting.sum', { terms: listTerms(wording, [term, ...tied]) });
  const { change, interval } = fact.values;
  const isEstimated = fact.kind !== 'cant-tell' || fact.values.because !== 'not-judged';
  const size = isEstimated ? sayChange(wording, fact, term, tied.length > 0) : '';
  return {
    name: capitalize(names),
    size: interval === null && change === 0 ? '' : size,
    call: sentences([
      sayVerdict(wording, fact, term),
      fact.values.sure === 'not' ? null : t(`verdict:sure.${fact.values.sure}`),
    ]),
  };
}

function sayChange(wording: Wording, fact: CallFact, term: string, isTied: boolean): string {
  const change = resultWords(wording, fact.refs.results?.[0]).change(
    fact.values.change,
    fact.values.interval,
  );
  return term.length === 1 && !isTied && isChoice(wording, term)
    ? wording.t('verdict:call.choice', { option: sayEnd(wording, term, 1), change })
    : change;
}

function sayVerdict(wording: Wording, fact: CallFact, term: string): string {
  const { t } = wording;
  switch (fact.kind) {
    case 'matters':
      return fact.values.settled ? t('verdict:call.matters.settled') : t('verdict:call.matters.open');
    case 'real-but-small':
      return t('verdict:call.realButSmall');
    case 'no-real-difference': {
      if (fact.values.orCancel) return t('verdict:call.noDifference.orCancel');
      if (term.length > 1) return t('verdict:call.noDifference.pair');
      const kind = isChoice(wording, term) ? 'choice' : 'numbers';
      return t(`verdict:call.noDifference.${kind}`, {
        low: sayEnd(wording, term, -1),
        high: sayEnd(wording, term, 1),
      });
    }
    case 'cant-tell':
      return sentences([t('verdict:call.cantTell'), t(`verdict:call.because.${fact.values.because}`)]);
  }
}

/** A setting whose change is another on either side of its partner: one row for each side. */
export function sayDepends(fact: DependsFact, wording: Wording): CallWords[] {
  const { t } = wording;
  const [letter = '', partner = ''] = fact.refs.factors ?? [];
  const words = resultWords(wording, fact.refs.results?.[0]);
  const { partnerLow, partnerLowInterval, partnerHigh, partnerHighInterval } = fact.values;
  const row = (level: -1 | 1, change: number, interval: [number, number] | null): CallWords => ({
    name: capitalize(
      t('verdict:setting.withPartner', {
        setting: changeName(wording, letter),
        partner: settingAt(wording, partner, level),
      }),
    ),
    size: words.change(change, interval),
    call: t('verdict:call.depends', { partner: settingName(wording, partner) }),
  });
  return [row(-1, partnerLow, partnerLowInterval), row(1, partnerHigh, partnerHighInterval)];
}

/** One call as a line of text. */
export function sayCallLine({ name, size, call }: CallWords, { t }: Wording): string {
  return size === '' ? t('verdict:call.bare', { name, call }) : t('verdict:call.line', { name, size, call });
}

export const callSayings = {
  matters: (fact: CallFact, wording: Wording) => sayCallLine(sayCall(fact, wording), wording),
  'real-but-small': (fact: CallFact, wording: Wording) => sayCallLine(sayCall(fact, wording), wording),
  'no-real-difference': (fact: CallFact, wording: Wording) => sayCallLine(sayCall(fact, wording), wording),
  'cant-tell': (fact: CallFact, wording: Wording) => sayCallLine(sayCall(fact, wording), wording),
  'depends-on-partner': (fact: DependsFact, wording: Wording) =>
    sentences(sayDepends(fact, wording).map((row) => sayCallLine(row, wording))),
};
