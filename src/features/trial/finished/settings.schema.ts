import { z } from 'zod';
import { settingEnds } from '../answer-choices.ts';
import { figure, foldName, line, neededFigure, neededLine, point } from './typed-fields.ts';

const mostHard = 2;

const manners = {
  id: z.string(),
  name: neededLine,
  panelName: line,
  hard: z.boolean().default(false),
  settleMinutes: figure({ atLeast: 0, atMost: 10_080 }),
  discardParts: figure({ atLeast: 0, atMost: 1_000_000, whole: true }),
  harderEnd: z.enum(['low', 'high', 'neither']).default('neither'),
};

const numberSetting = z
  .strictObject({
    kind: z.literal('number'),
    ...manners,
    unit: line,
    low: neededFigure(),
    high: neededFigure(),
    usual: neededFigure(),
    step: figure({ above: 0 }),
    min: figure(),
    max: figure(),
  })
  .superRefine(({ low, high, usual, step, min, max }, context) => {
    if (!(low < high)) return point(context, ['low'], 'low-not-below-high');
    if (min !== null && low < min) point(context, ['low'], 'beyond-machine');
    if (max !== null && high > max) point(context, ['high'], 'beyond-machine');
    if (usual < low || usual > high) point(context, ['usual'], 'usual-outside');
    // Low, middle and high must be three places of the dial.
    if (step !== null && 2 * step > (high - low) * (1 + 1e-9)) point(context, ['step'], 'step-too-coarse');
  });

const choiceSetting = z
  .strictObject({
    kind: z.literal('choice'),
    ...manners,
    low: neededLine,
    high: neededLine,
    usual: z.enum(settingEnds),
  })
  .superRefine(({ low, high }, context) => {
    if (foldName(low) === foldName(high)) point(context, ['high'], 'same-name');
  });

export const settingsFinished = z.strictObject({
  settings: z
    .array(z.discriminatedUnion('kind', [numberSetting, choiceSetting]))
    .min(1)
    .max(7)
    .superRefine((settings, context) => {
      const names = settings.map(({ name }) => foldName(name));
      names.forEach((name, place) => {
        if (names.indexOf(name) < place) point(context, [place, 'name'], 'same-name');
      });
      const hard = settings.flatMap((setting, place) => (setting.hard ? [place] : []));
      const tooMany = hard[mostHard];
      if (tooMany !== undefined) point(context, [tooMany, 'hard'], 'too-many-hard');
    }),
});
export type FinishedSetting = z.output<typeof settingsFinished>['settings'][number];
