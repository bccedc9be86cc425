import { z } from 'zod';
import { lookDecisions, paces, readyChecks, runWays, settingEnds } from '../answer-choices.ts';
import { figure, line, neededLine, point } from './typed-fields.ts';

/** What stands where nothing was typed; the pages say so in words. */
export const planDefaults = {
  maxRuns: 16,
  /** Minutes to set the machine, make the parts and write down the number, besides waiting for it. */
  minutesPerRun: 10,
  remindMinutes: 40,
  remindTimes: 2,
} as const;

export const spareFinished = z
  .strictObject({
    runs: figure({ atLeast: 4, atMost: 64, whole: true }),
    hours: figure({ above: 0 }),
    hoursOpen: z.boolean().default(false),
    money: figure({ above: 0 }),
    moneyOpen: z.boolean().default(false),
    minutesPerRun: figure({ above: 0, atMost: 10_080 }),
    costPerRun: figure({ atLeast: 0 }),
  })
  .superRefine(({ money, moneyOpen, costPerRun }, context) => {
    // A limit that nothing can be held against would be no limit.
    if (money !== null && !moneyOpen && costPerRun === null) point(context, ['costPerRun'], 'missing');
  });

const wallTime = line.refine((text) => text === '' || /^([01]\d|2[0-3]):[0-5]\d$/.test(text), {
  error: 'not-a-time',
});
const day = line.refine(
  (text) => text === '' || (/^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text))),
  { error: 'not-a-date' },
);

export const crewFinished = z.strictObject({
  shifts: z
    .array(
      z.strictObject({
        id: z.string(),
        name: line,
        from: wallTime,
        to: wallTime,
        runs: neededLine,
        /** Empty: whoever runs. */
        measures: line,
        calls: line,
      }),
    )
    .min(1),
  ways: z.partialRecord(z.string(), z.enum(runWays)).default({}),
});

export const paceFinished = z
  .strictObject({
    /** Empty: when the trial is started. */
    startDate: day,
    startTime: wallTime,
    next: z.enum(paces).default('made'),
    everyMinutes: figure({ atLeast: 1, atMost: 10_080 }),
    remindMinutes: figure({ atLeast: 1, atMost: 1_440 }),
    remindTimes: figure({ atLeast: 0, atMost: 2, whole: true }),
  })
  .superRefine(({ next, everyMinutes }, context) => {
    if (next === 'every' && everyMinutes === null) point(context, ['everyMinutes'], 'missing');
  });

export const lookFinished = z.strictObject({
  mixes: z.array(
    z.strictObject({ ends: z.record(z.string(), z.enum(settingEnds)), decision: z.enum(lookDecisions) }),
  ),
});

export const readyFinished = z
  .strictObject({ ticked: z.array(z.enum(readyChecks)) })
  .superRefine(({ ticked }, context) => {
    if (!readyChecks.every((check) => ticked.includes(check))) point(context, ['ticked'], 'tick-all');
  });
