import {
  AnalysisError,
  type Brief,
  type ConfirmationVerdict,
  coreVersion,
  judge,
  judgeConfirmation,
  type Proposal,
  type ResultInput,
  readCheckRuns,
  settingsToTry,
} from '../../lib/doe/index.ts';
import { hashOf } from '../trial/reviewed-hash.service.ts';
import type { JudgedRun, VerdictFacts } from './stored-verdict.ts';
import { figureOf, toPlannedRuns, toResultInputs } from './verdict-input.ts';
import type { VerdictRun } from './verdict-runs.ts';

/** Everything a verdict depends on. */
export interface TrialToJudge {
  brief: Brief;
  proposal: Proposal;
  runs: readonly VerdictRun[];
  /** Empty before there were any. */
  checkRuns: readonly VerdictRun[];
}

export interface Judgement {
  inputHash: string;
  coreVersion: string;
  results: ResultInput[];
  facts: VerdictFacts;
}

function toJudgedRun(run: VerdictRun, results: number): JudgedRun {
  return {
    number: run.number,
    order: run.place,
    planned: run.planned,
    coded: run.coded,
    readings: Array.from({ length: results }, (_, result) =>
      run.readings
        .filter((reading) => reading.result === result)
        .flatMap(({ value, rejects }) => rejects ?? value ?? []),
    ),
    end: run.end ?? 'notRun',
  };
}

/** Equal where the same plan has the same readings: row ids and moments do not count. */
export function hashInput({ brief, proposal, runs, checkRuns }: TrialToJudge): string {
  const bare = (list: readonly VerdictRun[]) =>
    list.map(({ id: _, readings, ...run }) => ({
      ...run,
      readings: readings.map((reading) => ({ ...reading })),
    }));
  return hashOf({
    brief,
    errorPlan: proposal.errorPlan,
    terms: proposal.terms,
    runs: bare(runs),
    checkRuns: bare(checkRuns),
  });
}

function judgeChecks(
  trial: TrialToJudge,
  main: ResultInput,
  bet: VerdictFacts['bet'],
): ConfirmationVerdict | null {
  const { brief, checkRuns } = trial;
  const specs = [brief.response, ...brief.watch];
  const readings = readCheckRuns(
    brief,
    main.analysis.scale,
    checkRuns.map((run) => ({
      group: run.group,
      results: specs.map((spec, result) => {
        const { y, n } = figureOf(
          spec,
          run.readings.filter((reading) => reading.result === result),
        );
        return y === null ? null : { y, ...(n === undefined ? {} : { n }) };
      }),
    })),
  );
  if (readings.atBest.length === 0 || readings.atUsual.length === 0) return null;
  return judgeConfirmation(brief, bet, readings);
}

/** Works the verdict out. @returns null where no run has a reading, so that there is nothing to judge */
export function judgeTrial(trial: TrialToJudge): Judgement | null {
  const { brief, proposal, runs } = trial;
  try {
    const results = toResultInputs(brief, proposal, runs);
    const [main] = results;
    if (!main) return null;
    const bet = settingsToTry(brief, results);
    return {
      inputHash: hashInput(trial),
      coreVersion,
      results,
      facts: {
        v: 1,
        verdict: judge(brief, toPlannedRuns(runs), results),
        bet,
        confirmation: judgeChecks(trial, main, bet),
        runs: runs.map((run) => toJudgedRun(run, results.length)),
      },
    };
  } catch (error) {
    if (error instanceof AnalysisError) return null;
    throw error;
  }
}
