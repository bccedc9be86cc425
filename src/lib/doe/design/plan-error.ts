import { z } from '../zod.ts';

/** Why no plan can be proposed. Stored and sent as data; `field` is a path into the brief such as `factors.0.low`. */
export const planRefusalSchema = z.object({
  code: z.enum([
    'malformed',
    'not-a-number',
    'missing',
    'not-positive',
    'not-whole',
    'out-of-range',
    'no-factors',
    'too-many-factors',
    'too-many-hard-factors',
    'empty-name',
    'duplicate-name',
    'low-not-below-high',
    'same-choice-names',
    'usual-outside',
    'beyond-machine-limits',
    'step-too-coarse',
    'limits-crossed',
    'unknown-letter',
    'empty-rule',
    'everything-forbidden',
    'too-much-forbidden',
    'too-few-runs',
    'too-little-time',
    'too-little-money',
    'blocks-too-small',
    'too-many-blocks',
  ]),
  field: z.string(),
  /** The smallest change that would help: the value that `field` would need, in its own unit; null where no single value would do. */
  need: z.number().nullable(),
});

export type PlanRefusal = z.infer<typeof planRefusalSchema>;

export type PlanErrorCode = PlanRefusal['code'];

/** Thrown by `proposePlans` when the brief makes no sense or nothing fits its limits. */
export class PlanError extends Error implements PlanRefusal {
  override readonly name = 'PlanError';
  readonly code: PlanErrorCode;
  readonly field: string;
  readonly need: number | null;

  constructor({ code, field, need }: PlanRefusal) {
    super(`${code} at ${field}${need === null ? '' : `, needs ${need}`}`);
    this.code = code;
    this.field = field;
    this.need = need;
  }
}
