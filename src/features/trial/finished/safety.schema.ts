import { z } from 'zod';
import { languages } from '../../../i18n/languages.ts';
import { cautionNames, hazardNames, partsFates, settingEnds, stopRules } from '../answer-choices.ts';
import { line, neededLine, point, words } from './typed-fields.ts';

export const hazardsFinished = z
  .strictObject({
    none: z.boolean().default(false),
    ticked: z.array(
      z
        .strictObject({
          hazard: z.enum(hazardNames),
          cautions: z.array(z.enum(cautionNames)),
          protects: words,
        })
        .superRefine(({ cautions, protects }, context) => {
          if (cautions.length === 0 && protects === '') point(context, ['protects'], 'missing');
        }),
    ),
  })
  .superRefine(({ none, ticked }, context) => {
    // That nothing can hurt anyone is a statement of its own, never a list left empty.
    if (none === ticked.length > 0) point(context, ['none'], 'some-or-none');
  });

export const stopFinished = z
  .strictObject({
    picked: z.array(z.enum(stopRules)),
    own: z.partialRecord(z.enum(languages), line).default({}),
  })
  .superRefine(({ picked, own }, context) => {
    const isSaid = picked.length > 0 || Object.values(own).some((text) => text !== '');
    if (!isSaid) point(context, ['picked'], 'missing');
  });

export const callFinished = z.strictObject({
  lines: z.array(z.strictObject({ id: z.string(), when: line, whom: neededLine })).min(1),
});

export const neverRunFinished = z.strictObject({
  mixes: z.array(
    z.strictObject({
      id: z.string(),
      parts: z
        .array(z.strictObject({ setting: z.string(), end: z.enum(settingEnds) }))
        .superRefine((parts, context) => {
          if (parts.length < 2) point(context, [], 'mix-of-two');
          const named = parts.map(({ setting }) => setting);
          named.forEach((setting, place) => {
            if (named.indexOf(setting) < place) point(context, [place, 'setting'], 'same-name');
          });
        }),
    }),
  ),
});

export const partsFinished = z.strictObject({ fate: z.enum(partsFates), label: line });
