import type { ActivityDetail } from '../../server/db/activity-log.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { insertReading, setReadingStates } from './readings.repository.ts';
import { completeFigure, faultOfFigure, type ResultItem } from './result-items.ts';
import type { Figure, Reading, ReadingSource, ReadingState } from './run.ts';

/** How figures came in. */
export interface Submission {
  /** Names this very sending: sent twice, it is kept once. */
  submission: string;
  source: ReadingSource;
  inboxTextId?: string | null;
  /** A person's id. */
  enteredBy: string | null;
  reason?: string | null;
}

/** @throws AppError `invalid` naming each figure that cannot be one of its result */
export function requireSoundFigures(items: readonly ResultItem[], figures: readonly Figure[]): void {
  const fields = figures.flatMap((figure) => {
    const code = faultOfFigure(items, figure);
    return code === null ? [] : [{ pointer: `#/figures/${figure.result}-${figure.part}`, code }];
  });
  const places = new Set(figures.map(({ result, part }) => `${result}-${part}`));
  if (places.size < figures.length) fields.push({ pointer: '#/figures', code: 'does-not-fit' });
  if (fields.length > 0) throw new AppError('invalid', { fields });
}

/** Readings that still stand for something. */
export function standing(readings: readonly Reading[]): Reading[] {
  return readings.filter(({ state }) => state === 'counts' || state === 'asked back');
}

/**
 * Adds figures to a run; each takes the place of what stood for its part.
 * @returns all figures of the run that count afterwards, where these do
 */
export async function keepFigures(
  scope: ShopScope,
  about: {
    runId: string;
    items: readonly ResultItem[];
    before: readonly Reading[];
    figures: readonly Figure[];
    state: ReadingState;
  },
  submission: Submission,
): Promise<Figure[]> {
  const { runId, items, before, figures, state } = about;
  const stood = standing(before);
  const kept: Figure[] = [];
  for (const typed of figures) {
    const figure = completeFigure(items, typed);
    const olds = stood.filter(({ result, part }) => result === figure.result && part === figure.part);
    await setReadingStates(
      scope,
      olds.map(({ id }) => id),
      'replaced',
    );
    await insertReading(scope, runId, {
      ...figure,
      ...submission,
      state,
      replacesId: olds.at(-1)?.id ?? null,
    });
    kept.push(figure);
  }
  const untouched = stood.filter(
    (old) =>
      old.state === 'counts' && !kept.some(({ result, part }) => result === old.result && part === old.part),
  );
  return [...untouched, ...kept];
}

/** Keeps that a run ended without a figure: whatever stood no longer counts, and who said so is on record. */
export async function keepEndWithoutFigure(
  scope: ShopScope,
  about: { runId: string; before: readonly Reading[] },
  submission: Submission,
): Promise<void> {
  await setReadingStates(
    scope,
    standing(about.before).map(({ id }) => id),
    'not used',
  );
  const none = { result: 0, part: 1, value: null, rejects: null, lot: null };
  await insertReading(scope, about.runId, { ...none, ...submission, state: 'not used' });
}

/** Figures as the log keeps them. */
export function logFigures(figures: readonly Figure[]): ActivityDetail[] {
  return figures.map(({ result, part, value, rejects, lot }) => [result, part, value, rejects, lot]);
}
