import { AnalysisError, coreVersion } from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { hashOf } from '../trial/reviewed-hash.service.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { hashInput } from '../verdict/judge-trial.service.ts';
import { readTrialToJudge } from '../verdict/make-verdict.service.ts';
import type { StoredVerdict } from '../verdict/stored-verdict.ts';
import { findVerdict } from '../verdict/verdict.repository.ts';
import { toResultInputs } from '../verdict/verdict-input.ts';
import { listFactors } from './audit-factors.ts';
import type { AuditModelView } from './audit-view.ts';
import type { AuditLook } from './frame/audit-parts.ts';
import { isJudged } from './read-frame.service.ts';
import { findStoredAnalysis } from './stored-analysis.repository.ts';

/** Digit for digit, in whatever order the fields were written. */
function isEqual(stored: string | null, now: unknown): boolean {
  return stored !== null && hashOf(JSON.parse(stored)) === hashOf(now);
}

function agreement(
  verdict: StoredVerdict,
  stored: string | null,
  now: unknown,
): NonNullable<AuditModelView['verdict']>['agrees'] {
  if (isEqual(stored, now)) return 'same';
  return verdict.coreVersion === coreVersion ? 'differs' : 'otherCore';
}

/** Why there is no model to show. */
export type NoModel = 'no-plan' | 'not-in' | 'no-readings' | 'no-result';

/**
 * The trial's own model of one result, worked out from the readings as they stand, and whether that is what the latest
 * verdict was made from.
 * @throws AppError `not-found`, for another shop's trial too
 */
export async function readAuditModel(
  scope: ShopScope,
  trialId: string,
  { result = 0 }: AuditLook = {},
): Promise<AuditModelView | NoModel> {
  const trial = await findTrialOf(scope, trialId);
  const judged = await readTrialToJudge(scope, trialId);
  if (!judged) return 'no-plan';
  if (!(await isJudged(scope, trial))) return 'not-in';
  const { brief, proposal, runs } = judged;
  try {
    const results = toResultInputs(brief, proposal, runs);
    const found = results[result];
    if (!found) return 'no-result';
    const inputHash = hashInput(judged);
    const verdict = await findVerdict(scope, trialId);
    const stored = verdict && (await findStoredAnalysis(scope, trialId, verdict.n));
    return {
      spec: found.spec,
      result,
      factors: listFactors(brief),
      brief,
      input: found.input,
      analysis: found.analysis,
      transform: { kind: 'none' },
      runNumbers: runs.map(({ number }) => number),
      name: null,
      inputHash,
      verdict:
        verdict && verdict.inputHash === inputHash
          ? {
              n: verdict.n,
              coreVersion: verdict.coreVersion,
              agrees: agreement(verdict, stored, { v: 1, results }),
            }
          : null,
    };
  } catch (error) {
    if (error instanceof AnalysisError) return 'no-readings';
    throw error;
  }
}
