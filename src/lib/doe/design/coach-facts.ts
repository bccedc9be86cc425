import { defineFact } from '../define-fact.ts';
import { z } from '../zod.ts';

/** What is worth saying about answers while they are still being given. Settings are named by letter, in the order in which they stand. */
export const coachFacts = [
  /** The low end of a setting is not below its high end. */
  defineFact('low-not-below-high', { low: z.number(), high: z.number() }),
  /** The range is so few steps of the dial that its own play blurs it; from `leastWidth` on it would do. */
  defineFact('range-close-to-step', {
    low: z.number(),
    high: z.number(),
    step: z.number(),
    leastWidth: z.number(),
  }),
  /** One end lies beyond what the machine allows. */
  defineFact('end-beyond-machine', { end: z.enum(['low', 'high']), value: z.number(), limit: z.number() }),
  /** Today's value lies outside the range. */
  defineFact('usual-outside-range', { usual: z.number(), low: z.number(), high: z.number() }),
  /** Today's value is not where the middle runs will be; `middle` is where the dial can show it. */
  defineFact('usual-not-halfway', { usual: z.number(), middle: z.number() }),
  /** Two settings that may be one: the same name, or the same unit and values. */
  defineFact('settings-alike', { because: z.enum(['name', 'values']) }),
  /**
   * Too many settings for the runs there are: `neededToFit` runs for any plan, `neededApart` for one that keeps each setting apart from pairs of others,
   * its middle runs included. `mostApart` settings would be kept apart in the runs there are; 0: not even one fits.
   */
  defineFact('many-settings-for-runs', {
    settings: z.number(),
    runs: z.number(),
    neededToFit: z.number(),
    neededApart: z.number(),
    mostApart: z.number(),
  }),
  /** W is smaller than the smallest change that any plan within the limits would spot 8 times in 10. */
  defineFact('worth-having-below-sight', { worthHaving: z.number(), spots: z.number(), runs: z.number() }),
  /**
   * More parts a run steady its mean only down to the spread of setting up (`floor`): with so many parts it is `runSd`. From `enoughParts` on it is at
   * most a tenth above that floor. `assumed`: nobody gave the set-up spread.
   */
  defineFact('parts-meet-setup', {
    parts: z.number(),
    runSd: z.number(),
    floor: z.number(),
    enoughParts: z.number(),
    assumed: z.boolean(),
  }),
] as const;
