import type { Brief } from '../brief.ts';
import { setDials } from '../design/dial.ts';
import { isForbidden } from '../design/forbidden.ts';
import type { Failures } from './failures.ts';
import type { ResultModel } from './result-model.ts';

export interface CandidateQuestion {
  brief: Brief;
  model: ResultModel;
  usual: readonly number[];
  failures: Failures;
  /** Combinations with readings. */
  tested: readonly (readonly number[])[];
  /** The middle is off the line through the corners, so nothing between or beside what was run can be trusted. */
  onlyTested: boolean;
  /** Some result has limits, or some combinations are ruled out. */
  constrained: boolean;
  /** Places of the settings that stay as usual. */
  stay: ReadonlySet<number>;
}

/** Settings that may be proposed: inside the tested range, never forbidden, away from failures, on the dials' steps. Usual settings come first. */
export function listCandidates(question: CandidateQuestion): number[][] {
  const { brief, usual, failures, tested, onlyTested, stay } = question;
  const stays = (x: readonly number[]) =>
    x.every((value, place) => !stay.has(place) || value === usual[place]);
  const allowed = (x: readonly number[]) => stays(x) && !isForbidden(brief, x) && !failures.excludes(x);
  const levels = (place: number, others: readonly number[]) =>
    stay.has(place) ? [usual[place] ?? 0] : others;
  const start = [[...usual]];
  if (onlyTested) return [...start, ...distinct(tested).filter(allowed)];
  const corners = gridOf(brief.factors.map((_, place) => levels(place, [-1, 1]))).filter(allowed);
  if (question.constrained)
    // Where limits or rules bind, a setting left as it is may be the best way to keep them.
    start.push(
      ...gridOf(usual.map((value, place) => levels(place, [...new Set([-1, value, 1])]))).filter(allowed),
    );
  if (brief.response.goal !== 'target') return [...start, ...corners];
  return [...start, ...corners, ...pointsOnTarget(question, corners).filter(allowed)];
}

/**
 * Points on the edges of the cube at which the target is expected: along an edge the result is a straight line, so one division finds the setting.
 */
function pointsOnTarget({ brief, model, stay }: CandidateQuestion, corners: readonly number[][]): number[][] {
  const target = model.scale.fromUnit(brief.response.target ?? 0);
  const constant = meanOf(model, corners[0] ?? []);
  return corners.flatMap((corner) =>
    brief.factors.flatMap((factor, place) => {
      if (factor.kind !== 'number' || (corner[place] ?? 0) > 0 || stay.has(place)) return [];
      const low = constant + model.expected(corner);
      const high = constant + model.expected(corner.with(place, 1));
      const share = (target - low) / (high - low);
      return share > 0 && share < 1 ? [setDials(brief, corner.with(place, 2 * share - 1)).coded] : [];
    }),
  );
}

/** What `expected` leaves out: the constant of the model. */
export function meanOf(model: ResultModel, x: readonly number[]): number {
  const { parts } = model.level(x);
  return parts.reduce((sum, part) => sum + part.weight * part.mean, 0) - model.expected(x);
}

function gridOf(levels: readonly (readonly number[])[]): number[][] {
  return levels.reduce<number[][]>(
    (points, values) => values.flatMap((value) => points.map((point) => [...point, value])),
    [[]],
  );
}

function distinct(points: readonly (readonly number[])[]): number[][] {
  return [...new Map(points.map((x) => [x.join(' '), [...x]])).values()];
}
