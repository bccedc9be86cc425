import type { RunWay } from '../trial/answer-choices.ts';
import { readFinished } from '../trial/answer-problem.ts';
import type { Answers, QuestionName } from '../trial/answers.schema.ts';
import { planDefaults } from '../trial/finished/start.schema.ts';
import type { FinishedOf } from '../trial/finished.schema.ts';
import type { TrialState } from '../trial/trial-states.ts';
import { guessRange, type Range } from './plausible.ts';

/** One result that every run is measured for. */
export interface RunItem {
  /** 0 the main result, 1 to 3 the watched ones. */
  result: number;
  /** How `readReply` and the texts know it. */
  key: string;
  kind: 'measured' | 'rejects' | 'flaws';
  name: string;
  unit: string;
  /** Numbers a run gives; one count for rejects and flaws. */
  readings: number;
  lotSize: number | null;
  /** What would surprise nobody, from today's figures; null: nobody knows. */
  range: Range | null;
  /** Today's usual figure. */
  usual: number | null;
}

export interface RunSetting {
  id: string;
  /** As the machine's panel calls it. */
  name: string;
  unit: string;
  usual: number | string;
  /** What the setting may be, for the dial in the texts and the mark on a tag. */
  low: number | string;
  high: number | string;
}

/** Who does what on one shift. Minutes after midnight; both null: at any hour. */
export interface RunShift {
  name: string;
  fromMinute: number | null;
  toMinute: number | null;
  runs: string;
  /** The same person where nobody else measures. */
  measures: string;
  /** A person's id, or whatever was typed; empty for the trial's owner. */
  calls: string;
}

/** Everything that running a trial needs to know, out of the frozen answers and the plan. */
export interface RunningTrial {
  id: string;
  number: number;
  title: string;
  machine: string;
  ownerId: string;
  state: TrialState;
  phase: 'main' | 'check';
  revision: number;
  hazard: boolean;
  items: RunItem[];
  /** In the order of a run's planned values. */
  settings: RunSetting[];
  /** The numbers come later than the parts, or from somebody else. */
  resultsLater: boolean;
  /** The numbers come the next day or later. */
  resultsNextDay: boolean;
  /** Minutes until a result is there; null: at once, or the next day. */
  resultMinutes: number | null;
  shifts: RunShift[];
  ways: Readonly<Record<string, RunWay>>;
  pace: { next: 'made' | 'go' | 'every'; everyMinutes: number; startDate: string; startTime: string };
  remindMinutes: number;
  remindTimes: number;
  /** Minutes to settle and parts to throw away, the most that any setting asks for. */
  settleMinutes: number;
  discardParts: number;
  /** Parts to make, and what to write on them. */
  makeParts: number;
  label: string;
  /** Minutes that a run takes at least; an answer much sooner is asked about. */
  shortestMinutes: number;
}

export type RunningTrialHead = Pick<
  RunningTrial,
  'id' | 'number' | 'title' | 'machine' | 'ownerId' | 'state' | 'phase' | 'revision'
>;

function finished<Name extends QuestionName>(answers: Answers, question: Name): FinishedOf<Name> {
  const read = readFinished(answers, question);
  // A trial starts only with finished answers, and they are frozen from then on.
  if ('problems' in read) throw new RangeError(`describeRunningTrial: answers.${question} is not finished`);
  return read.value as FinishedOf<Name>;
}

/**
 * What running a trial needs, out of its frozen answers.
 * @param settingIds the setting behind each place of a run's planned values
 * @throws RangeError for answers that no trial can have been started with
 */
export function describeRunningTrial(
  head: RunningTrialHead,
  answers: Answers,
  settingIds: readonly string[],
): RunningTrial {
  const { settings } = finished(answers, 'settings');
  const measuring = finished(answers, 'measuring');
  const spare = finished(answers, 'spare');
  const parts = finished(answers, 'parts');
  const crew = finished(answers, 'crew');
  const pace = finished(answers, 'pace');
  const items = listItems(answers, measuring.partsPerRun ?? 1);
  const settleMinutes = Math.max(0, ...settings.map((setting) => setting.settleMinutes ?? 0));
  const shifts = crew.shifts.map(({ name, from, to, runs, measures, calls }) => ({
    name,
    fromMinute: toMinute(from),
    toMinute: toMinute(to),
    runs,
    measures: measures === '' ? runs : measures,
    calls,
  }));
  return {
    ...head,
    hazard: finished(answers, 'hazards').ticked.length > 0,
    items,
    settings: settingIds.map((id) => describeSetting(settings, id)),
    resultsLater: measuring.when !== 'atOnce' || shifts.some(({ runs, measures }) => measures !== runs),
    resultsNextDay: measuring.when === 'later',
    resultMinutes: measuring.when === 'minutes' ? measuring.minutes : null,
    shifts,
    ways: crew.ways as Readonly<Record<string, RunWay>>,
    pace: {
      next: pace.next,
      everyMinutes: pace.everyMinutes ?? 0,
      startDate: pace.startDate,
      startTime: pace.startTime,
    },
    remindMinutes: pace.remindMinutes ?? planDefaults.remindMinutes,
    remindTimes: pace.remindTimes ?? planDefaults.remindTimes,
    settleMinutes,
    discardParts: Math.max(0, ...settings.map((setting) => setting.discardParts ?? 0)),
    makeParts: Math.max(
      ...items.map(({ kind, readings, lotSize }) => (kind === 'measured' ? readings : (lotSize ?? 1))),
    ),
    label: parts.label,
    shortestMinutes: Math.max(spare.minutesPerRun ?? 0, settleMinutes),
  };
}

function listItems(answers: Answers, partsPerRun: number): RunItem[] {
  const result = finished(answers, 'result');
  const usual = finished(answers, 'usual');
  const worth = finished(answers, 'worth').change;
  const watched = finished(answers, 'watch').results;
  const main = { ...result, usual: usual.usual };
  return [main, ...watched].map((one, place) => {
    const kind = one.kind === 'scored' ? 'measured' : one.kind;
    const seen = place === 0 ? [usual.lowest, usual.highest, usual.usual, ...usual.past] : [one.usual];
    const known = seen.filter((figure) => figure !== null);
    const isScored = one.kind === 'scored';
    return {
      result: place,
      key: `r${place}`,
      kind,
      name: one.name,
      unit: one.unit,
      readings: kind === 'measured' && place === 0 ? partsPerRun : 1,
      lotSize: one.lotSize,
      range: isScored
        ? { low: 0, high: 10 }
        : kind === 'measured'
          ? guessRange(known, place === 0 ? worth : 0)
          : null,
      usual: one.usual,
    };
  });
}

function describeSetting(settings: FinishedOf<'settings'>['settings'], id: string): RunSetting {
  const setting = settings.find((one) => one.id === id);
  if (!setting) throw new RangeError('describeRunningTrial: settingIds names a setting that is not there');
  const name = setting.panelName === '' ? setting.name : setting.panelName;
  if (setting.kind === 'number') {
    const { unit, usual, low, high } = setting;
    return { id, name, unit, usual, low, high };
  }
  return { id, name, unit: '', usual: setting[setting.usual], low: setting.low, high: setting.high };
}

function toMinute(wallTime: string): number | null {
  if (wallTime === '') return null;
  const [hour = 0, minute = 0] = wallTime.split(':').map(Number);
  return hour * 60 + minute;
}
