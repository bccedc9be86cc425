import { z } from 'zod';
import type { Translate } from '../../i18n/translator.ts';

/** What one text asks for: one result of one run. */
export const askSchema = z.strictObject({
  kind: z.enum(['measured', 'rejects', 'flaws']),
  /** The result's name as the shop typed it. */
  name: z.string().min(1),
  /** How many numbers. */
  count: z.number().int().min(1),
  /** Parts looked at, where rejects are counted. */
  lot: z.number().int().optional(),
  /** A reply as it may look. */
  example: z.string().min(1),
});
export type Ask = z.output<typeof askSchema>;

/** What has just come in and stands above the next run, so that one text says both. */
export const leadSchema = z.strictObject({
  what: z.enum(['saved', 'made', 'skipped']),
  run: z.number().int(),
  /** The numbers that were kept; needed for `saved`. */
  values: z.string().optional(),
});
export type Lead = z.output<typeof leadSchema>;

export const runPromptSchema = z.strictObject({
  lead: leadSchema.optional(),
  machine: z.string().min(1),
  run: z.number().int().min(1),
  runs: z.number().int().min(1),
  /** Each setting by its panel's name, with its value. */
  settings: z.array(z.strictObject({ name: z.string().min(1), value: z.string().min(1) })).min(1),
  /** Minutes to let the machine settle; 0 says nothing of it. */
  wait: z.number().min(0),
  /** Parts to throw away after the change; 0 says nothing of it. */
  discard: z.number().int().min(0),
  /** Parts to make. */
  make: z.number().int().min(1),
  /** What to write on them; empty for nothing. */
  label: z.string(),
  ask: askSchema,
  /** The numbers come later: only DONE is wanted now. */
  later: z.boolean(),
  hazard: z.boolean(),
  /** Made to warm the machine up. */
  warmUp: z.boolean().optional(),
});
export type RunPrompt = z.output<typeof runPromptSchema>;

export function writeAsk(t: Translate, { kind, name, count, lot, example }: Ask): string {
  if (kind === 'measured') return t('run-texts:run.measured', { name, count, example });
  if (kind === 'rejects') return t('run-texts:run.rejects', { name, lot: lot ?? '?', example });
  return t('run-texts:run.flaws', { name, example });
}

export function writeLead(t: Translate, { what, run, values = '' }: Lead): string {
  if (what === 'saved') return t('run-texts:lead.saved', { run, values });
  return what === 'made' ? t('run-texts:lead.made', { run }) : t('run-texts:lead.skipped', { run });
}

/**
 * The run as a person reads it on a small screen: machine and run first, then one line a setting with its value last on
 * the line and nothing behind it. No name or value is ever cut: `tooLongBy` says beforehand what must be shortened.
 */
export function writeRunPrompt(t: Translate, prompt: RunPrompt): string {
  const { lead, machine, run, runs, settings, ask, later, hazard, warmUp } = prompt;
  return [
    ...(lead ? [writeLead(t, lead)] : []),
    warmUp ? t('run-texts:run.warmUp', { machine, run }) : t('run-texts:run.head', { machine, run, runs }),
    ...settings.map(({ name, value }) => `${name} ${value}`),
    writePreparation(t, prompt),
    later ? t('run-texts:run.whenMade') : writeAsk(t, ask),
    ...(hazard ? [t('run-texts:run.danger')] : []),
  ].join('\n');
}

function writePreparation(t: Translate, { wait, discard, make, label }: RunPrompt): string {
  return [
    ...(wait > 0 ? [t('run-texts:run.wait', { minutes: wait })] : []),
    ...(discard > 0 ? [t('run-texts:run.discard', { parts: discard })] : []),
    label === ''
      ? t('run-texts:run.make', { parts: make })
      : t('run-texts:run.makeAndMark', { parts: make, label }),
  ].join(' ');
}
