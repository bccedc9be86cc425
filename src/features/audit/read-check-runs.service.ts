import { checkGroups, compareCheckRuns, readCheckRuns } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { judgeTrial } from '../verdict/judge-trial.service.ts';
import { readTrialToJudge } from '../verdict/make-verdict.service.ts';
import { figureOf } from '../verdict/verdict-input.ts';
import { listFactors } from './audit-factors.ts';
import type { AuditChecksView } from './audit-view.ts';

/** The check runs of a trial as they stand; null where none were planned. */
export async function readAuditCheckRuns(scope: ShopScope, trialId: string): Promise<AuditChecksView | null> {
  const judged = await readTrialToJudge(scope, trialId);
  if (!judged || judged.checkRuns.length === 0) return null;
  const { brief, checkRuns } = judged;
  const found = judgeTrial(judged);
  const specs = [brief.response, ...brief.watch];
  const figures = checkRuns.map((run) => ({
    group: run.group,
    results: specs.map((spec, result) => {
      const { y, n } = figureOf(
        spec,
        run.readings.filter((reading) => reading.result === result),
      );
      return y === null ? null : { y, ...(n === undefined ? {} : { n }) };
    }),
  }));
  const scale = found?.results[0]?.analysis.scale;
  const readings = scale ? readCheckRuns(brief, scale, figures) : null;
  const isBoth = readings !== null && readings.atBest.length > 0 && readings.atUsual.length > 0;
  return {
    spec: brief.response,
    factors: listFactors(brief),
    comparison: found && isBoth ? compareCheckRuns(found.facts.bet, readings) : null,
    outcome: found?.facts.confirmation?.outcome ?? null,
    runs: checkRuns.map((run, place) => ({
      number: run.number,
      place: run.place,
      isBest: run.group === checkGroups.best,
      figure: figures[place]?.results[0]?.y ?? null,
      settings: run.actual ?? run.planned,
    })),
  };
}
