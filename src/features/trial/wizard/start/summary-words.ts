import type { TFunction } from 'i18next';
import type { Language } from '../../../../i18n/languages.ts';
import { type AroundWay, aroundThings, aroundWays } from '../../answer-choices.ts';
import type { Answers, SettingAnswer } from '../../answers.schema.ts';
import type { PublicPlan } from '../../plan.schema.ts';
import type { WizardStep } from '../../questions.ts';
import { endValueOf, panelNameOf } from '../setting-words.ts';
import { aboutTime } from '../so-far-words.ts';
import type { WizardShop } from '../wizard-context.ts';

export interface SummaryInput {
  answers: Answers;
  plan: PublicPlan | null;
  shop: WizardShop;
  t: TFunction<'wizard-safety'>;
  tSafety: TFunction<'safety'>;
  tFrame: TFunction<'wizard-frame'>;
  list: (items: string[]) => string;
  language: Language;
}

/** What was typed, as the wizard's pages put it in one line. */
function typed(text: string | undefined): string {
  return text?.trim() ?? '';
}

function withUnit(figure: string | undefined, { answers }: SummaryInput): string {
  const unit = answers.result?.kind === 'measured' ? typed(answers.result.unit) : '';
  const value = typed(figure);
  return /^[\d.,+\-\u2212]+$/.test(value) ? `${value} ${unit}`.trim() : value;
}

function problemWords(input: SummaryInput): string[] {
  const { answers, t } = input;
  const { name, wish, target } = answers.result ?? {};
  if (!typed(name) || !wish) return [];
  const wanted = t(`start.wish.${wish}`, { target: withUnit(target, input) });
  const words = { machine: typed(answers.job?.machine), result: typed(name), wish: wanted };
  return [t('start.problem', words)];
}

function todayWords(input: SummaryInput): string[] {
  const { answers, t } = input;
  const usual = withUnit(answers.usual?.usual, input);
  const worth = withUnit(answers.worth?.change, input);
  const lines = [
    usual && t('start.usual', { usual }),
    !usual && answers.usual?.notSure && t('start.usualNotSure'),
    worth && t('start.worth', { change: worth }),
  ];
  const said = lines.filter((line): line is string => typeof line === 'string' && line !== '');
  return said.length > 0 ? [said.join(' ')] : [];
}

/** One setting with its two ends; nothing until all three are typed. */
export function settingWords(setting: SettingAnswer, t: TFunction<'wizard-safety'>): string[] {
  const [low, high] = [endValueOf(setting, 'low'), endValueOf(setting, 'high')];
  const name = panelNameOf(setting);
  if (!name || low === null || high === null) return [];
  return [t(setting.kind === 'choice' ? 'start.choice' : 'start.number', { name, low, high })];
}

function settingsWords({ answers, t }: SummaryInput): string[] {
  return (answers.settings?.settings ?? []).flatMap((setting) => settingWords(setting, t));
}

function safetyWords({ answers, t, tSafety, list, language }: SummaryInput): string[] {
  const { hazards, stop, call, neverRun } = answers;
  const ticked = hazards?.ticked.map(({ hazard }) => tSafety(`hazard.${hazard}`)) ?? [];
  const own = typed(stop?.own?.[language]) || typed(Object.values(stop?.own ?? {})[0]);
  const rules = [...(stop?.picked.map((rule) => tSafety(`stop.${rule}`)) ?? []), ...(own ? [own] : [])];
  const whom = call?.lines.map((line) => typed(line.whom)).filter((text) => text !== '') ?? [];
  const mixes = neverRun?.mixes.length ?? 0;
  return [
    ...(hazards?.none ? [t('start.noHazard')] : []),
    ...(ticked.length > 0 ? [list(ticked)] : []),
    ...(rules.length > 0 ? [t('start.stopOn', { rules: list(rules) })] : []),
    ...(whom.length > 0 ? [t('start.call', { whom: list(whom) })] : []),
    ...(mixes > 0 ? [t('start.neverRun', { count: mixes })] : []),
  ];
}

function aroundWords({ answers, t, list }: SummaryInput): string[] {
  const around = answers.around ?? {};
  const thingsOf = (way: AroundWay) => [
    ...aroundThings.filter((thing) => around[thing]?.way === way).map((thing) => t(`around.thing.${thing}`)),
    ...(around.own ?? []).filter((own) => (own.way ?? 'writeDown') === way).map((own) => typed(own.name)),
  ];
  return aroundWays
    .filter((way) => way !== 'noIssue')
    .flatMap((way) => {
      const things = thingsOf(way).filter((thing) => thing !== '');
      return things.length > 0
        ? [t('start.aroundLine', { way: t(`around.way.${way}`), things: list(things) })]
        : [];
    });
}

function planWords({ plan, t, tFrame, list, language }: SummaryInput): string[] {
  if (!plan) return [t('start.planNone')];
  const { runs, minutes } = plan.proposal;
  const facts = [
    t('start.plan', { count: runs }),
    ...(minutes === undefined ? [] : [aboutTime(minutes, tFrame, language)]),
  ];
  return [list(facts), ...(plan.fits ? [] : [t('start.planStale')])];
}

function crewWords({ answers, shop, t }: SummaryInput): string[] {
  const nameOf = (id: string | undefined) => shop.people.find((person) => person.id === id)?.name;
  return (answers.crew?.shifts ?? []).flatMap(({ name, runs }) => {
    const who = nameOf(runs);
    if (who === undefined) return [];
    return typed(name) ? [t('start.shift', { shift: typed(name), who })] : [who];
  });
}

const wordsOf = {
  problem: problemWords,
  today: todayWords,
  settings: settingsWords,
  safety: safetyWords,
  around: aroundWords,
  plan: planWords,
  crew: crewWords,
} as const satisfies Partial<Record<WizardStep, (input: SummaryInput) => string[]>>;

/** What was said on a page, in one line or a few; nothing where nothing was. */
export function summaryOf(step: keyof typeof wordsOf, input: SummaryInput): string[] {
  return wordsOf[step](input);
}
