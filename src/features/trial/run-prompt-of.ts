import type { Language } from '../../i18n/languages.ts';
import type { RunPrompt } from '../message/run-prompt.ts';
import { readFinished } from './answer-problem.ts';
import type { Answers, QuestionName } from './answers.schema.ts';
import type { FinishedSetting } from './finished/settings.schema.ts';
import type { FinishedOf } from './finished.schema.ts';
import type { PublicRun } from './plan.schema.ts';

/** A run of a plan and what it counts among. */
export interface PromptedRun {
  run: Pick<PublicRun, 'order' | 'planned'>;
  runs: number;
  /** The id of the setting behind each planned value. */
  settingIds: readonly string[];
}

/** Where nobody knows today's figure, an example still needs one. */
const anyFigure = 10;
const anyCount = 3;

/** A dial's value without marks between thousands: "1,200" would be read as one and a bit somewhere. */
function dialWriter(language: Language): (value: number | string) => string {
  const format = new Intl.NumberFormat(language, { useGrouping: false, maximumFractionDigits: 6 });
  return (value) => (typeof value === 'number' ? format.format(value) : value);
}

/** Readings as they may look: today's figure, a little under and a little over, with its decimals. */
function exampleOf(usual: number, count: number, write: (value: number) => string): string {
  const decimals = String(usual).split('.')[1]?.length ?? 0;
  const step = usual === 0 ? 1 : Math.abs(usual) * 0.02;
  // A small figure would look the same three times without a finer step.
  const shown = Math.abs(usual) < 3 ? Math.max(2, decimals) : decimals;
  const signs = [0, -1, 1];
  const figures = Array.from(
    { length: count },
    (_, place) => usual + step * (signs[place % signs.length] ?? 0),
  );
  return figures.map((figure) => write(Number(figure.toFixed(shown)))).join(' ');
}

function askFor(
  result: FinishedOf<'result'>,
  about: { parts: number; usual: number | null; write: (value: number) => string },
): RunPrompt['ask'] {
  const { name, kind, lotSize } = result;
  const { parts, usual, write } = about;
  if (kind === 'rejects' || kind === 'flaws') {
    const example = write(Math.round(usual ?? anyCount));
    return { kind, name, count: 1, ...(lotSize === null ? {} : { lot: lotSize }), example };
  }
  return { kind: 'measured', name, count: parts, example: exampleOf(usual ?? anyFigure, parts, write) };
}

function mostOf(settings: readonly FinishedSetting[], field: 'settleMinutes' | 'discardParts'): number {
  return Math.max(0, ...settings.map((setting) => setting[field] ?? 0));
}

/**
 * What the text of a run says, as one that sets every dial afresh; null while an answer that stands in it is missing.
 * @param language of the reader, for the decimal mark
 */
export function runPromptOf(answers: Answers, prompted: PromptedRun, language: Language): RunPrompt | null {
  const finished = <Name extends QuestionName>(question: Name): FinishedOf<Name> | null => {
    const read = readFinished(answers, question);
    return 'value' in read ? read.value : null;
  };
  const job = finished('job');
  const result = finished('result');
  const measuring = finished('measuring');
  const usual = finished('usual');
  const settings = finished('settings')?.settings;
  if (!job || !result || !measuring || !usual || !settings) return null;
  const write = dialWriter(language);
  const parts = measuring.partsPerRun ?? 1;
  const watched = finished('watch')?.results ?? [];
  const lots = [result, ...watched].map(({ lotSize }) => lotSize ?? 0);
  const fate = finished('parts');
  return {
    machine: job.machine,
    run: prompted.run.order,
    runs: prompted.runs,
    settings: prompted.settingIds.flatMap((id, place) => {
      const setting = settings.find((each) => each.id === id);
      const value = prompted.run.planned[place];
      if (!setting || value === undefined) return [];
      return { name: setting.panelName || setting.name, value: write(value) };
    }),
    wait: mostOf(settings, 'settleMinutes'),
    discard: mostOf(settings, 'discardParts'),
    make: Math.max(parts, ...lots),
    label: fate?.fate === 'hold' ? fate.label : '',
    ask: askFor(result, { parts, usual: usual.usual, write }),
    later: measuring.when !== 'atOnce' || measuring.who === 'other',
    hazard: (answers.hazards?.ticked.length ?? 0) > 0,
  };
}
