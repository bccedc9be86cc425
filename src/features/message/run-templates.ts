import { z } from 'zod';
import { askSchema, leadSchema, runPromptSchema, writeAsk, writeLead, writeRunPrompt } from './run-prompt.ts';
import { text } from './template-kind.ts';

const run = z.number().int();
const words = z.string();
/** Goes out at the shift's hours. */
const told = { version: 1, audience: 'agreed', answersText: false } as const;
/** Answers what the person has just texted. */
const answer = { version: 1, audience: 'agreed', answersText: true } as const;

/** The texts of a running trial, to those who make and measure. */
const toCrew = {
  runPrompt: text({ ...answer, params: runPromptSchema }, writeRunPrompt),
  /** What came in, where no next run follows at once. */
  noted: text({ ...answer, params: leadSchema }, writeLead),
  resultsWanted: text(
    { ...told, params: z.strictObject({ machine: words, run, label: words, ask: askSchema }) },
    (t, { label, ask, ...rest }) =>
      label === ''
        ? t('run-texts:resultsWanted', { ...rest, ask: writeAsk(t, ask) })
        : t('run-texts:resultsWantedLabel', { ...rest, label, ask: writeAsk(t, ask) }),
  ),
  nextResult: text({ ...answer, params: z.strictObject({ run, ask: askSchema }) }, (t, { ask, ...rest }) =>
    t('run-texts:nextResult', { ...rest, ask: writeAsk(t, ask) }),
  ),
  odd: text({ ...answer, params: z.strictObject({ run, values: words }) }, (t, params) =>
    t('run-texts:odd', params),
  ),
  sameAsSetting: text({ ...answer, params: z.strictObject({ run, values: words }) }, (t, params) =>
    t('run-texts:sameAsSetting', params),
  ),
  quick: text({ ...answer, params: z.strictObject({ run, before: run, values: words }) }, (t, params) =>
    t('run-texts:quick', params),
  ),
  whichRun: text({ ...answer, params: z.strictObject({ values: words, runs: words }) }, (t, params) =>
    t('run-texts:whichRun', params),
  ),
  whichReading: text(
    { ...answer, params: z.strictObject({ run, before: words, values: words }) },
    (t, params) => t('run-texts:whichReading', params),
  ),
  cannotAsk: text({ ...answer, params: z.strictObject({ example: words, caller: words }) }, (t, params) =>
    t('run-texts:cannotAsk', params),
  ),
  cannotNoted: text({ ...answer, params: z.strictObject({ actual: words, caller: words }) }, (t, params) =>
    t('run-texts:cannotNoted', params),
  ),
  cannotUse: text({ ...told, params: z.strictObject({ run, machine: words }) }, (t, params) =>
    t('run-texts:cannotUse', params),
  ),
  cannotLater: text({ ...told, params: z.strictObject({ run, machine: words }) }, (t, params) =>
    t('run-texts:cannotLater', params),
  ),
  cannotOut: text({ ...told, params: z.strictObject({ run, machine: words }) }, (t, params) =>
    t('run-texts:cannotOut', params),
  ),
  whoIsOn: text({ ...told, params: z.strictObject({ machine: words }) }, (t, params) =>
    t('run-texts:whoIsOn', params),
  ),
  photoNoted: text({ ...answer, params: z.strictObject({ run }) }, (t, params) =>
    t('run-texts:photoNoted', params),
  ),
  unread: text({ ...answer, params: z.strictObject({ run, ask: askSchema }) }, (t, { ask, ...rest }) =>
    t('run-texts:unread', { ...rest, ask: writeAsk(t, ask) }),
  ),
  howMany: text({ ...answer, params: z.strictObject({ run, ask: askSchema }) }, (t, { ask, ...rest }) =>
    t('run-texts:howMany', { ...rest, ask: writeAsk(t, ask) }),
  ),
  unreadIdle: text({ ...answer, params: z.strictObject({}) }, (t) => t('run-texts:unreadIdle')),
  noRun: text({ ...answer, params: z.strictObject({ caller: words }) }, (t, params) =>
    t('run-texts:noRun', params),
  ),
  remind: text(
    { ...told, params: z.strictObject({ run, machine: words, later: z.boolean() }) },
    (t, { later, ...rest }) => (later ? t('run-texts:remindMade', rest) : t('run-texts:remind', rest)),
  ),
  later: text({ ...answer, params: z.strictObject({ run, minutes: z.number() }) }, (t, params) =>
    t('run-texts:later', params),
  ),
  go: text({ ...answer, params: z.strictObject({ lead: leadSchema }) }, (t, { lead }) =>
    [writeLead(t, lead), t('run-texts:go')].join('\n'),
  ),
  problemNoted: text({ ...answer, params: z.strictObject({ caller: words }) }, (t, params) =>
    t('run-texts:problemNoted', params),
  ),
  batchNoted: text({ ...answer, params: z.strictObject({ batch: words }) }, (t, params) =>
    t('run-texts:batchNoted', params),
  ),
  batchAsk: text({ ...answer, params: z.strictObject({}) }, (t) => t('run-texts:batchAsk')),
  helpRun: text(
    { ...answer, params: z.strictObject({ run, ask: askSchema, caller: words }) },
    (t, { ask, ...rest }) => t('run-texts:help', { ...rest, ask: writeAsk(t, ask) }),
  ),
  helpIdle: text({ ...answer, params: z.strictObject({}) }, (t) => t('run-texts:helpIdle')),
  phoneLink: text(
    { ...answer, holdsSecret: true, params: z.strictObject({ link: z.url({ protocol: /^https?$/ }) }) },
    (t, params) => t('run-texts:link', params),
  ),
  handedOver: text({ ...told, params: z.strictObject({ run, machine: words, name: words }) }, (t, params) =>
    t('run-texts:handedOver', params),
  ),
  closedRun: text({ ...answer, params: z.strictObject({ run, caller: words }) }, (t, params) =>
    t('run-texts:closedRun', params),
  ),
  stopped: text(
    { ...answer, params: z.strictObject({ machine: words, settings: words, caller: words }) },
    (t, params) => t('run-texts:stopped', params),
  ),
  resumed: text({ ...told, params: z.strictObject({ machine: words }) }, (t, params) =>
    t('run-texts:resumed', params),
  ),
  backToUsual: text(
    { ...answer, params: z.strictObject({ machine: words, runs: run, settings: words }) },
    (t, params) => t('run-texts:backToUsual', params),
  ),
  endedEarly: text({ ...told, params: z.strictObject({ machine: words, settings: words }) }, (t, params) =>
    t('run-texts:endedEarly', params),
  ),
  backDone: text({ ...answer, params: z.strictObject({ machine: words }) }, (t, params) =>
    t('run-texts:backDone', params),
  ),
} as const;

/** The texts of a running trial to whoever is called. */
const toCaller = {
  /** A run as it will look, to the phone of whoever plans the trial. */
  practiceRun: text({ ...told, params: z.strictObject({ prompt: runPromptSchema }) }, (t, { prompt }) =>
    [t('run-texts:practiceRun'), writeRunPrompt(t, prompt)].join('\n'),
  ),
  allIn: text({ ...told, params: z.strictObject({ title: words, runs: run }) }, (t, params) =>
    t('run-texts:allIn', params),
  ),
  problemRaised: text(
    { ...told, params: z.strictObject({ machine: words, run: run.nullable(), name: words, words }) },
    (t, { run: number, ...rest }) =>
      number === null
        ? t('run-texts:problemAtMachine', rest)
        : t('run-texts:problemRaised', { ...rest, run: number }),
  ),
  cannotReach: text(
    { ...told, params: z.strictObject({ machine: words, run, name: words, actual: words }) },
    (t, params) => t('run-texts:cannotReach', params),
  ),
  noAnswer: text({ ...told, params: z.strictObject({ machine: words, run, name: words }) }, (t, params) =>
    t('run-texts:noAnswer', params),
  ),
  stopTexted: text({ ...told, params: z.strictObject({ machine: words, run, name: words }) }, (t, params) =>
    t('run-texts:stopTexted', params),
  ),
  lateReading: text(
    { ...told, params: z.strictObject({ machine: words, run, name: words, words }) },
    (t, params) => t('run-texts:lateReading', params),
  ),
  unreadTexts: text({ ...told, params: z.strictObject({ name: words, machine: words }) }, (t, params) =>
    t('run-texts:unreadTexts', params),
  ),
} as const;

export const runTemplates = { ...toCrew, ...toCaller } as const;
