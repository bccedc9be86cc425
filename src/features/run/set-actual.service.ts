import type { FieldProblem } from '../../i18n/field-codes.ts';
import type { FactorSpec } from '../../lib/doe/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { findTrialOf } from '../trial/trial-reader.service.ts';
import { reopenVerdict } from './reopen-verdict.service.ts';
import type { SettingValue } from './run.ts';
import { findRunOf, requirePlan, requireRunStep, takeRunStep } from './run-reader.service.ts';

function faultOfValue(factor: FactorSpec | undefined, value: SettingValue): string | null {
  if (!factor) return 'does-not-fit';
  if (factor.kind === 'number') return typeof value === 'number' ? null : 'not-a-number';
  return value === factor.low || value === factor.high ? null : 'not-a-choice';
}

function requireFit(factors: readonly FactorSpec[], values: readonly SettingValue[]): void {
  const fields: FieldProblem[] = values.flatMap((value, place) => {
    const code = faultOfValue(factors[place], value);
    return code === null ? [] : [{ pointer: `#/actual/${place}`, code }];
  });
  if (values.length < factors.length) fields.push({ pointer: '#/actual', code: 'missing' });
  if (fields.length > 0) throw new AppError('invalid', { fields });
}

/**
 * Writes down what the dials were really set to, where a setting could not be reached or was set otherwise. The same as
 * planned takes it back.
 * @param wish.actual one value a setting, in the order of the plan
 * @throws AppError `invalid` naming the values, `not-found`, `not-now`, `changed-meanwhile`
 */
export function setActual(
  scope: ShopScope,
  wish: { runId: string; revision?: number | undefined; actual: SettingValue[] },
): Promise<void> {
  return inTransaction(scope, async (inner) => {
    const run = await findRunOf(inner, wish.runId);
    const step = requireRunStep(run, 'set actual');
    requireFit((await requirePlan(inner, run.trialId)).brief.factors, wish.actual);
    const isAsPlanned = wish.actual.every((value, place) => value === run.planned[place]);
    const actual = isAsPlanned ? null : wish.actual;
    await takeRunStep(inner, run, step, { revision: wish.revision, actual });
    // Names of choices are the shop's own words and stay out of the log: a place says which setting was meant.
    const changed = wish.actual.flatMap((value, place) =>
      value === run.planned[place] ? [] : [[place, typeof value === 'number' ? value : null]],
    );
    await recordActivity(inner, {
      kind: 'run.actual-set',
      subjectId: run.id,
      trialId: run.trialId,
      details: { run: run.number, changed },
    });
    await reopenVerdict(inner, await findTrialOf(inner, run.trialId));
  });
}
