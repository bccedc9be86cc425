import { defineFact } from '../define-fact.ts';
import { z } from '../zod.ts';

/** What can be said about a plan before any run: reasons for it and warnings about it. */
export const designFacts = [
  defineFact('cheapest-with-power', { power: z.number(), runs: z.number() }),
  defineFact('most-power-within-limits', { power: z.number(), runs: z.number() }),
  defineFact('main-effects-tied-to-pairs', { resolution: z.number() }),
  defineFact('pairs-tied', { resolution: z.number() }),
  defineFact('all-effects-separate', {}),
] as const;
