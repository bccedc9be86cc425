import {
  type Alternative,
  AnalysisError,
  analyzeAlternative,
  type ResultInput,
} from '../../lib/doe/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { listRuns } from '../run/run.repository.ts';
import { hashInput, type TrialToJudge } from '../verdict/judge-trial.service.ts';
import { readTrialToJudge } from '../verdict/make-verdict.service.ts';
import { toResultInputs } from '../verdict/verdict-input.ts';
import type { ModelSpec } from './model.schema.ts';

/** The readings of a trial as every model of it starts from. */
export interface ModelBasis {
  judged: TrialToJudge;
  results: ResultInput[];
  inputHash: string;
  /** By place among the runs: the stretch each was made in. */
  stretches: string[];
}

/** @throws AppError `not-now` for a trial without readings */
export async function readModelBasis(scope: ShopScope, trialId: string): Promise<ModelBasis> {
  const judged = await readTrialToJudge(scope, trialId);
  if (!judged) throw new AppError('not-now', { detail: 'the trial was not started' });
  try {
    const results = toResultInputs(judged.brief, judged.proposal, judged.runs);
    const rows = new Map((await listRuns(scope, trialId)).map((run) => [run.id, run.stretchId]));
    return {
      judged,
      results,
      inputHash: hashInput(judged),
      stretches: judged.runs.map(({ id }) => rows.get(id) ?? ''),
    };
  } catch (error) {
    if (error instanceof AnalysisError) throw new AppError('not-now', { detail: error.code });
    throw error;
  }
}

function refuse(pointer: string, code = 'does-not-fit'): AppError {
  return new AppError('invalid', { fields: [{ pointer, code }] });
}

/**
 * Works an engineer's model out from the readings as they stand.
 * @throws AppError `invalid` naming what does not fit: a response that is not there, a letter without a factor, a run that
 * is not of the trial, a scale on which a reading has no place, nothing left to analyze
 */
export function workOutModel(basis: ModelBasis, spec: ModelSpec): Alternative & { found: ResultInput } {
  const found = basis.results[spec.result];
  if (!found) throw refuse('#/spec/result');
  const letters = new Set(found.input.factors.map(({ letter }) => letter));
  if (spec.terms.some((term) => [...term].some((letter) => !letters.has(letter))))
    throw refuse('#/spec/terms');
  const { runs } = basis.judged;
  const without = spec.without.map(({ run }, at) => {
    const place = runs.findIndex(({ number }) => number === run);
    if (place < 0) throw refuse(`#/spec/without/${at}/run`);
    return place;
  });
  try {
    const worked = analyzeAlternative(found.input, {
      terms: spec.terms,
      refuseHierarchy: spec.refuseHierarchy,
      transform: spec.transform,
      without,
      error: spec.error,
      ...(spec.stretchesAsBlocks ? { stretches: basis.stretches } : {}),
    });
    return { ...worked, found };
  } catch (error) {
    if (!(error instanceof AnalysisError)) throw error;
    throw refuse(error.code === 'reading-outside-scale' ? '#/spec/transform' : '#/spec/without', 'off-scale');
  }
}
