import type { Formats } from '../../../i18n/format.ts';
import type { Translate } from '../../../i18n/translator.ts';
import type { CsvCell } from './safe-csv.ts';
import type { TrialFile } from './trial-file.schema.ts';

/** Who reads the pack: the language and manner of every text in it that is for people. */
export interface PackReader {
  t: Translate;
  formats: Formats;
  language: string;
}

const scriptWords = [
  'result',
  'effect',
  'curvature',
  'error',
  'anova',
  'fit',
  'run',
  'lenth',
  'within',
  'prediction',
  'columns',
  'notRecomputed',
  'not.rung',
  'not.plan',
  'not.bet',
  'not.checks',
  'not.steadiness',
  'not.limits',
  'noVerdict',
  'onlyOnce',
  'largest',
  'differs',
  'disagrees',
  'agrees',
] as const;

/** What the script prints; it reads its words from a table, so that it speaks the reader's language. */
export function listScriptWords(t: Translate): CsvCell[][] {
  return [['key', 'text'], ...scriptWords.map((key) => [key, t(`audit-pack:r.${key}`)])];
}

export const packFiles = {
  readings: 'readings.csv',
  trial: 'trial.json',
  schema: 'trial.schema.json',
  report: 'report.html',
  activity: 'activity.csv',
  script: 'recompute.R',
  settings: 'settings.csv',
  results: 'results.csv',
  points: 'points.csv',
  limits: 'limits.csv',
  product: 'product.csv',
  words: 'words.csv',
} as const;

const described = Object.keys(packFiles) as (keyof typeof packFiles)[];

/** README.txt: what each file is, and how the numbers are worked out again. */
export function writeReadme(file: TrialFile, { t, formats }: PackReader, madeAt: number): string {
  const { number, title } = file.trial;
  const verdict = file.verdicts.at(-1);
  const date = formats.dateTime(madeAt);
  const made = verdict
    ? t('audit-pack:readme.made', { date, n: verdict.n, hash: verdict.inputHash })
    : t('audit-pack:readme.madeEarly', { date });
  const heading = t('audit-pack:readme.title', { number, title });
  return [
    heading,
    '='.repeat(heading.length),
    '',
    made,
    t('audit-pack:readme.people'),
    '',
    ...described.map((name) => t(`audit-pack:readme.file.${name}`, { file: packFiles[name] })),
    '',
    t('audit-pack:readme.rerun'),
    t('audit-pack:readme.rerunEnd'),
    '',
  ].join('\r\n');
}
