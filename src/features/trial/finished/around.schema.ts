import { z } from 'zod';
import { type AroundThing, type AroundWay, aroundWays, waysFor } from '../answer-choices.ts';
import { figure, neededLine, point, words } from './typed-fields.ts';

const wayNames = waysFor as Record<AroundThing, readonly AroundWay[]>;

function finishedThing(thing: AroundThing) {
  const schema = z
    .strictObject({
      way: z.enum(aroundWays),
      /** Null: two. */
      count: figure({ whole: true }),
      runsEach: figure({ atLeast: 1, whole: true }),
      words,
    })
    .superRefine(({ way, count }, context) => {
      if (!wayNames[thing].includes(way)) point(context, ['way'], 'not-a-choice');
      if (way === 'split' && count !== null && count !== 2 && count !== 4) {
        point(context, ['count'], 'two-or-four');
      }
    });
  // A thing that nobody spoke of is a choice not made.
  return z.preprocess((typed) => typed ?? {}, schema);
}

/** The things that runs can be split by. */
export const splitThings = ['batch', 'shift', 'machine'] as const;

export const aroundFinished = z
  .strictObject({
    batch: finishedThing('batch'),
    shift: finishedThing('shift'),
    machine: finishedThing('machine'),
    gauge: finishedThing('gauge'),
    room: finishedThing('room'),
    crew: finishedThing('crew'),
    own: z
      .array(
        z.strictObject({
          id: z.string(),
          name: neededLine,
          way: z.enum(['same', 'writeDown', 'noIssue']).default('writeDown'),
          words,
        }),
      )
      .default([]),
  })
  .superRefine((around, context) => {
    const [, second] = splitThings.filter((thing) => around[thing].way === 'split');
    if (second) point(context, [second, 'way'], 'one-split');
  });
