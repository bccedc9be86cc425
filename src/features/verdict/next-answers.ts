import { type BestBet, type Brief, letterAt, usualValues, type Verdict } from '../../lib/doe/index.ts';
import type { Answers, SettingAnswer } from '../trial/answers.schema.ts';
import { carriedAnswers } from '../trial/carried-answers.ts';
import type { FollowReason } from './follow-reason.ts';
import { nextRanges } from './next-ranges.ts';
import { factsOf } from './page/page-wording.ts';

export interface FollowedTrial {
  answers: Answers;
  brief: Brief;
  /** The id of the setting behind each letter. */
  settingIds: readonly string[];
  bet: BestBet;
  verdict: Verdict;
  /** How many runs it had. */
  runs: number;
  /** Whether its new settings are what is used now. */
  adopted: boolean;
}

/** Plain digits, as a person types them in any language. */
const typed = (value: number) => String(Number(value.toPrecision(6)));

/**
 * The answers of the trial that follows, from what was learnt: everything as it was typed, but the ranges as the reason asks,
 * what is usual now, and room for the runs that it takes.
 */
export function nextAnswers(trial: FollowedTrial, reason: FollowReason): Answers {
  const { answers, brief, settingIds, adopted, bet, verdict } = trial;
  const usual = adopted ? bet.actual : usualValues(brief);
  const ranges = nextRanges({ brief, bet, reason, next: verdict.next, trust: verdict.trust, usual });
  const kept = keptLetters(trial, reason);
  const settings = (answers.settings?.settings ?? []).flatMap((setting) => {
    const place = settingIds.indexOf(setting.id);
    if (place >= 0 && !kept.has(letterAt(place))) return [];
    return [place < 0 ? setting : changed(setting, usual[place], ranges[place] ?? null)];
  });
  const ids = new Set(settings.map(({ id }) => id));
  const { neverRun } = answers;
  return {
    ...carriedAnswers(answers),
    ...(answers.job && { job: { ...answers.job, title: nextTitle(answers.job.title) } }),
    settings: { settings },
    // A rule about a setting that is tried no more would be no rule of this trial.
    ...(neverRun && {
      neverRun: {
        mixes: neverRun.mixes.filter(({ parts }) => parts.every(({ setting }) => ids.has(setting))),
      },
    }),
    ...(adopted && usualOf(trial)),
    ...(answers.spare && { spare: { ...answers.spare, runs: roomFor(trial, reason) } }),
  };
}

/** To tell settings apart only those are run again; they then get a plan that ties nothing. */
function keptLetters({ brief, verdict }: FollowedTrial, reason: FollowReason): ReadonlySet<string> {
  const all = brief.factors.map((_, place) => letterAt(place));
  const tied = reason === 'untie' ? factsOf(verdict.next, 'untie') : [];
  const letters = tied.flatMap(({ refs }) => (refs.terms ?? []).flatMap((term) => [...term]));
  return new Set(letters.length === 0 ? all : letters);
}

function changed(
  setting: SettingAnswer,
  usual: number | string | undefined,
  range: { low: number; high: number } | null,
): SettingAnswer {
  if (setting.kind === 'choice')
    return usual === undefined
      ? setting
      : { ...setting, usual: usual === setting.high?.trim() ? 'high' : 'low' };
  return {
    ...setting,
    ...(typeof usual === 'number' && { usual: typed(usual) }),
    ...(range && { low: typed(range.low), high: typed(range.high) }),
  };
}

/** What is usual for the result, once the new settings are: the day's low and high move along. */
function usualOf({ answers, brief, bet }: FollowedTrial): Pick<Answers, 'usual'> {
  const { kind, lotSize = 1 } = brief.response;
  const scale = kind === 'rejects' ? lotSize : 1;
  const [expected, change] = [bet.predicted * scale, bet.versusUsual * scale];
  const figure = (text: string | undefined) => {
    const value = Number((text ?? '').replace(',', '.').match(/-?[\d.]+/)?.[0] ?? Number.NaN);
    return Number.isFinite(value) ? { value } : null;
  };
  const [lowest, highest] = [figure(answers.usual?.lowest), figure(answers.usual?.highest)];
  return {
    usual: {
      ...(answers.usual?.notSure ? { notSure: true } : {}),
      usual: String(Number(expected.toPrecision(3))),
      ...(lowest && { lowest: String(Number(Math.max(0, lowest.value + change).toPrecision(3))) }),
      ...(highest && { highest: String(Number((highest.value + change).toPrecision(3))) }),
    },
  };
}

function roomFor({ answers, runs, verdict }: FollowedTrial, reason: FollowReason): string | undefined {
  const before = answers.spare?.runs;
  if (reason !== 'repeat-for-certainty') return before;
  const [more] = factsOf(verdict.next, 'repeat-for-certainty');
  return String(Math.max(Number(before) || 0, Math.min(64, runs + (more?.values.runs ?? 0))));
}

/** "Line 3 seals" is followed by "Line 3 seals 2", and that by "Line 3 seals 3". */
function nextTitle(title: string | undefined): string | undefined {
  if (!title) return title;
  const [, name = title, number] = /^(.*\D)\s(\d{1,2})$/.exec(title) ?? [];
  return /\b(?:line|lane|machine)$/i.test(name) || number === undefined
    ? `${title} 2`
    : `${name} ${Number(number) + 1}`;
}
