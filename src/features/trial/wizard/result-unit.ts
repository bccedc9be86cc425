import type { TFunction } from 'i18next';
import type { AnswerOf } from '../answers.schema.ts';

/** What stands behind a figure of a result: its unit, "out of 50", "out of 10", or what is counted. */
export function unitOfResult(
  { kind, unit, lotSize }: Pick<AnswerOf<'result'>, 'kind' | 'unit' | 'lotSize'>,
  t: TFunction<'wizard'>,
): string | undefined {
  if (kind === 'scored') return t('today.outOf', { lot: 10 });
  if (kind === 'rejects') return lotSize ? t('today.outOf', { lot: lotSize }) : undefined;
  if (kind === 'flaws') return t('today.flaws');
  return unit;
}
