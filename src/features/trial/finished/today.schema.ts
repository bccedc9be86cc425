import { z } from 'zod';
import { limitBearers } from '../answer-choices.ts';
import { checkResult, resultFinishedFields } from './problem.schema.ts';
import { figure, neededFigure, point, words } from './typed-fields.ts';
import { parseFigures } from './typed-figure.ts';

/** Past numbers say something of the ups and downs from here on. */
const fewestPast = 3;

export const usualFinished = z
  .strictObject({
    usual: figure(),
    lowest: figure(),
    highest: figure(),
    notSure: z.boolean().default(false),
    past: words.transform((text, context): number[] => {
      const figures = parseFigures(text);
      if (figures !== null) return figures;
      context.addIssue({ code: 'custom', message: 'not-a-number', input: text });
      return z.NEVER;
    }),
  })
  .superRefine(({ usual, lowest, highest, notSure, past }, context) => {
    if (past.length > 0 && past.length < fewestPast) point(context, ['past'], 'too-few-numbers');
    if (lowest !== null && highest !== null && !(lowest < highest)) {
      point(context, ['lowest'], 'low-not-below-high');
    }
    if (notSure || past.length > 0) return;
    if (usual === null) point(context, ['usual'], 'missing');
    if (lowest === null) point(context, ['lowest'], 'missing');
    if (highest === null) point(context, ['highest'], 'missing');
  });

export const worthFinished = z.strictObject({ change: neededFigure({ above: 0 }) });

const limitFields = {
  atLeast: figure(),
  atMost: figure(),
  limitFor: z.enum(limitBearers).default('mean'),
  noLimit: z.boolean().default(false),
};

interface FinishedLimit {
  atLeast: number | null;
  atMost: number | null;
}

function checkLimits({ atLeast, atMost }: FinishedLimit, context: z.RefinementCtx, path: PropertyKey[]) {
  if (atLeast !== null && atMost !== null && !(atLeast < atMost)) {
    point(context, [...path, 'atLeast'], 'low-not-below-high');
  }
}

export const limitFinished = z.strictObject(limitFields).superRefine((limit, context) => {
  checkLimits(limit, context, []);
  const isSilent = limit.atLeast === null && limit.atMost === null && !limit.noLimit;
  if (isSilent) point(context, ['atLeast'], 'limit-or-none');
});

export const watchFinished = z.strictObject({
  results: z
    .array(
      z
        .strictObject({ id: z.string(), ...resultFinishedFields, usual: figure(), ...limitFields })
        .superRefine((result, context) => {
          checkResult(result, context);
          checkLimits(result, context, []);
        }),
    )
    .max(3),
});

export const valueFinished = z.strictObject({
  partsPerWeek: figure({ above: 0 }),
  costOfBadPart: figure({ atLeast: 0 }),
});

export const gaugeFinished = z.strictObject({
  pairs: z.array(
    z.strictObject({ first: figure(), second: figure() }).superRefine(({ first, second }, context) => {
      if (first === null && second !== null) point(context, ['first'], 'missing');
      if (second === null && first !== null) point(context, ['second'], 'missing');
    }),
  ),
});
