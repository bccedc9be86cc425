import { z } from 'zod';
import { languages } from '../../i18n/languages.ts';
import '../people/schema-settings.ts';
import {
  aroundWays,
  cautionNames,
  hazardNames,
  limitBearers,
  lookDecisions,
  measuringTimes,
  paces,
  partsFates,
  readyChecks,
  resultKinds,
  runWays,
  settingEnds,
  starterNames,
  stopRules,
  wishes,
} from './answer-choices.ts';

/** What was typed into one field, as it was typed: a figure that does not parse is kept like any other. */
const typed = z.string().max(200).optional();
const longText = z.string().max(2_000).optional();
const flag = z.boolean().optional();
const key = z.string().min(1).max(40);

function choiceOf<const Names extends readonly [string, ...string[]]>(names: Names) {
  return z.enum(names).optional();
}

const limits = { atLeast: typed, atMost: typed, limitFor: choiceOf(limitBearers), noLimit: flag };

const resultFields = {
  name: typed,
  unit: typed,
  wish: choiceOf(wishes),
  target: typed,
  kind: choiceOf(resultKinds),
  lotSize: typed,
};

const settingManners = {
  id: key,
  name: typed,
  panelName: typed,
  hard: flag,
  settleMinutes: typed,
  discardParts: typed,
  harderEnd: z.enum(['low', 'high', 'neither']).optional(),
};

/** `low` and `high` of a choice are its two names. */
const settingAnswer = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('number'),
    ...settingManners,
    unit: typed,
    low: typed,
    high: typed,
    usual: typed,
    step: typed,
    min: typed,
    max: typed,
  }),
  z.strictObject({
    kind: z.literal('choice'),
    ...settingManners,
    low: typed,
    high: typed,
    usual: choiceOf(settingEnds),
  }),
]);

const aroundAnswer = z
  .strictObject({ way: choiceOf(aroundWays), count: typed, runsEach: typed, words: typed })
  .optional();

/**
 * The questions of the wizard, each saved and versioned by itself. Every field is optional and kept as typed; what a
 * finished answer must be is said in `finished.schema.ts`.
 */
export const questionSchemas = {
  // What is wrong?
  job: z.strictObject({ starter: choiceOf(starterNames), title: typed, machine: typed }),
  result: z.strictObject(resultFields),
  measuring: z.strictObject({
    who: z.enum(['operator', 'other']).optional(),
    whoName: typed,
    when: choiceOf(measuringTimes),
    minutes: typed,
    partsPerRun: typed,
    gaugeStep: typed,
  }),
  // How is it today?
  usual: z.strictObject({ usual: typed, lowest: typed, highest: typed, notSure: flag, past: longText }),
  worth: z.strictObject({ change: typed }),
  limit: z.strictObject(limits),
  watch: z.strictObject({
    results: z.array(z.strictObject({ id: key, ...resultFields, usual: typed, ...limits })).max(3),
  }),
  value: z.strictObject({ partsPerWeek: typed, costOfBadPart: typed }),
  gauge: z.strictObject({ pairs: z.array(z.strictObject({ first: typed, second: typed })).max(10) }),
  // What can you change?
  settings: z.strictObject({ settings: z.array(settingAnswer).max(7) }),
  // What could go wrong?
  hazards: z.strictObject({
    none: flag,
    ticked: z
      .array(
        z.strictObject({
          hazard: z.enum(hazardNames),
          cautions: z.array(z.enum(cautionNames)).max(cautionNames.length),
          protects: longText,
        }),
      )
      .max(hazardNames.length),
  }),
  stop: z.strictObject({
    picked: z.array(z.enum(stopRules)).max(stopRules.length),
    /** The same words once in each language of the crew. */
    own: z.partialRecord(z.enum(languages), z.string().max(200)).optional(),
  }),
  call: z.strictObject({ lines: z.array(z.strictObject({ id: key, when: typed, whom: typed })).max(4) }),
  neverRun: z.strictObject({
    mixes: z
      .array(
        z.strictObject({
          id: key,
          parts: z.array(z.strictObject({ setting: key, end: z.enum(settingEnds) })).max(7),
        }),
      )
      .max(12),
  }),
  parts: z.strictObject({ fate: choiceOf(partsFates), label: typed }),
  // What else could get in the way?
  around: z.strictObject({
    batch: aroundAnswer,
    shift: aroundAnswer,
    machine: aroundAnswer,
    gauge: aroundAnswer,
    room: aroundAnswer,
    crew: aroundAnswer,
    own: z
      .array(z.strictObject({ id: key, name: typed, way: choiceOf(aroundWays), words: typed }))
      .max(5)
      .optional(),
  }),
  // Pick a plan
  spare: z.strictObject({
    runs: typed,
    hours: typed,
    hoursOpen: flag,
    money: typed,
    moneyOpen: flag,
    minutesPerRun: typed,
    costPerRun: typed,
  }),
  // Who and when?
  crew: z.strictObject({
    shifts: z
      .array(
        z.strictObject({
          id: key,
          name: typed,
          from: typed,
          to: typed,
          /** People by their id; `measures` empty: whoever runs. */
          runs: typed,
          measures: typed,
          calls: typed,
        }),
      )
      .max(4),
    ways: z.partialRecord(z.string().max(40), z.enum(runWays)).optional(),
  }),
  pace: z.strictObject({
    startDate: typed,
    startTime: typed,
    next: choiceOf(paces),
    everyMinutes: typed,
    remindMinutes: typed,
    remindTimes: typed,
  }),
  // Check and start
  look: z.strictObject({
    /** One of the hardest mixes of the chosen plan: the end of each of its settings by the setting's id. */
    mixes: z
      .array(
        z.strictObject({
          ends: z.record(key, z.enum(settingEnds)),
          decision: choiceOf(lookDecisions),
        }),
      )
      .max(12),
  }),
  ready: z.strictObject({ ticked: z.array(z.enum(readyChecks)).max(readyChecks.length) }),
} as const;

export type QuestionName = keyof typeof questionSchemas;
export const questionNames = Object.keys(questionSchemas) as [QuestionName, ...QuestionName[]];

export function isQuestionName(text: string): text is QuestionName {
  return Object.hasOwn(questionSchemas, text);
}

/** What was typed for one question. */
export type AnswerOf<Name extends QuestionName> = z.output<(typeof questionSchemas)[Name]>;

/** Everything typed so far. A question that was never touched is absent. */
export type Answers = { [Name in QuestionName]?: AnswerOf<Name> | undefined };

/** The stored document. */
export const answersDocumentSchema = z
  .object({ v: z.literal(1), questions: z.object(questionSchemas).partial() })
  .readonly();

export type SettingAnswer = z.output<typeof settingAnswer>;
export type WatchedAnswer = AnswerOf<'watch'>['results'][number];
