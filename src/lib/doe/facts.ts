import { adviceFacts } from './advice/advice-facts.ts';
import { coachFacts } from './design/coach-facts.ts';
import { designFacts } from './design/design-facts.ts';
import { z } from './zod.ts';

export { type FactRefs, factRefsSchema } from './define-fact.ts';
export { type PlanRefusal, planRefusalSchema } from './design/plan-error.ts';

/**
 * Everything the core may say, as one union without words. Facts are stored with plans and verdicts, so a kind that was ever stored keeps its
 * meaning; a new meaning is a new kind. Each area keeps its kinds in a file of its own; they meet here.
 */
export const factSchema = z.discriminatedUnion('kind', [...coachFacts, ...designFacts, ...adviceFacts]);

export type Fact = z.infer<typeof factSchema>;

export type FactKind = Fact['kind'];
