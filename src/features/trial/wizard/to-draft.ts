import type { CoachDraft, DraftFactor } from '../../../lib/doe/index.ts';
import type { Answers, SettingAnswer } from '../answers.schema.ts';
import { toNoise } from '../brief/brief-limits.ts';
import { toCoreFigure } from '../brief/brief-result.ts';
import { planDefaults } from '../finished/start.schema.ts';
import { parseFigure } from '../finished/typed-figure.ts';
import { contentOf, finishedSchemas } from '../finished.schema.ts';

function figureOf(typed: string | undefined): number | null {
  return typed === undefined ? null : parseFigure(typed);
}

function toDraftFactor(setting: SettingAnswer): DraftFactor {
  const { name, hard, settleMinutes, discardParts } = setting;
  const manners = {
    name: name ?? null,
    hardToChange: hard ?? null,
    settleMinutes: figureOf(settleMinutes),
    discardParts: figureOf(discardParts),
  };
  if (setting.kind === 'choice') {
    const { low, high, usual } = setting;
    return { ...manners, kind: 'choice', low: low ?? null, high: high ?? null, usual: usual ?? null };
  }
  const { unit, low, high, usual, step, min, max } = setting;
  return {
    ...manners,
    kind: 'number',
    unit: unit ?? null,
    low: figureOf(low),
    high: figureOf(high),
    usual: figureOf(usual),
    step: figureOf(step),
    min: figureOf(min),
    max: figureOf(max),
  };
}

/** Answers as they stand, for remarks while somebody types: what is missing or no figure stays open. */
export function toDraft(answers: Answers): CoachDraft {
  const { result = {}, measuring = {}, worth = {}, settings, spare = {} } = answers;
  const kind = result.kind === 'scored' ? 'measured' : (result.kind ?? null);
  const scale = { kind: result.kind ?? 'measured', lotSize: figureOf(result.lotSize) };
  const toCore = (typed: string | undefined) => {
    const figure = figureOf(typed);
    return figure === null ? null : toCoreFigure(figure, scale);
  };
  const usual = finishedSchemas.usual.safeParse(contentOf(answers, 'usual'));
  const finished = finishedSchemas.result.safeParse(result);
  return {
    response: {
      kind,
      goal: result.wish ?? null,
      lotSize: scale.lotSize,
      partsPerRun: figureOf(measuring.partsPerRun),
      worthHaving: toCore(worth.change),
      usualRate: toCore(answers.usual?.usual),
      target: toCore(result.target),
    },
    factors: settings?.settings.map(toDraftFactor) ?? [],
    budget: {
      maxRuns: figureOf(spare.runs) ?? planDefaults.maxRuns,
      minutesPerRun: figureOf(spare.minutesPerRun),
      costPerRun: figureOf(spare.costPerRun),
      money: spare.moneyOpen ? null : figureOf(spare.money),
    },
    noise: usual.success && finished.success ? toNoise(usual.data, finished.data) : null,
  };
}
