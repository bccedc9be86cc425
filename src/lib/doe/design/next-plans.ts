import type { Brief, Letter } from '../brief.ts';
import { hasEnoughError } from './candidate.ts';
import { decideErrorPlan } from './error-plan.ts';
import {
  foldCorners,
  listAxialPoints,
  listCorners,
  listSessionMiddles,
  makeSession,
  rowsOf,
} from './next-runs.ts';
import type { Alias, ErrorPlan, LayoutRow, PlannedRun } from './proposal.ts';
import { listSeparateTerms } from './separate-terms.ts';
import { expectTimeAndMoney, type TimeAndMoney } from './time-and-money.ts';
import { findAliases } from './trace-aliases.ts';
import { lettersUpTo } from './words.ts';

/** Runs to add to a trial after a look at it: a session of their own, so a block of their own, with their own middles. */
export interface NextPlan extends TimeAndMoney {
  kind: 'fold-over' | 'fold-on-one' | 'half-fold' | 'axial' | 'repeat';
  /** The setting whose signs are turned round, where it is one. */
  letter?: Letter;
  /** Of a half fold: the runs with this setting at this level. */
  half?: { letter: Letter; level: -1 | 1 };
  /** In standard order, block 1; `layOutAddedRuns` puts them behind the runs before. */
  added: LayoutRow[];
  runs: number;
  /** Main effects and pairs that were tied and that all runs together estimate by themselves. */
  unties: string[];
  /** Of all runs together. */
  aliases: Alias[];
  /** Decided before the new runs, from the layout of all. */
  errorPlan: ErrorPlan;
  /** Points that nobody has looked at yet: the hazard question is asked again for them. */
  newCombinations: number[][];
}

export interface NextWish {
  /** A pair, or a main effect, to be told from what it is tied to. */
  untie?: string;
  /** The interval of the bend excludes zero: only then is the curve followed. */
  bendIsSure?: boolean;
}

/**
 * Plans that start from a finished trial: untangle what could not be told apart, follow a sure bend, repeat for certainty. The most telling first; none
 * goes outside the tested range.
 *
 * A main effect tied to pairs is untied by turning round all signs (G.E.P. Box & J.S. Hunter, 1961, Technometrics 3), pairs tied to pairs by turning
 * round one setting, or by half of those runs (R.W. Mee & M. Peralta, 2000, Technometrics 42).
 */
export function listNextPlans(brief: Brief, done: readonly PlannedRun[], wish: NextWish = {}): NextPlan[] {
  const before = rowsOf(done);
  const corners = listCorners(before);
  const letters = lettersUpTo(brief.factors.length);
  const plans: NextPlan[] = [];
  const separate = listSeparateTerms(before);
  if (letters.some((letter) => !separate.includes(letter))) {
    plans.push(
      ...addSession({ brief, before, kind: 'fold-over', points: foldCorners(brief, corners, letters) }),
    );
  }
  if (wish.untie !== undefined && !separate.includes(wish.untie))
    plans.push(...untie({ brief, before, corners, wanted: wish.untie }));
  if (wish.bendIsSure)
    plans.push(...addSession({ brief, before, kind: 'axial', points: listAxialPoints(brief) }));
  plans.push(...addSession({ brief, before, kind: 'repeat', points: corners }));
  // A fold that repeats the same runs unties nothing: that is a repeat, and is listed as one.
  return plans.filter((plan) => plan.kind === 'axial' || plan.kind === 'repeat' || plan.unties.length > 0);
}

interface Session {
  brief: Brief;
  before: readonly LayoutRow[];
  kind: NextPlan['kind'];
  points: readonly number[][];
}

/** A session with the fewest middle runs that give all runs together an error of their own; empty where no point may be run. */
function addSession({ brief, before, kind, points }: Session): NextPlan[] {
  if (points.length === 0) return [];
  const inPlots = before.some((row) => row.wholePlot !== undefined);
  const sessions = listSessionMiddles(brief, points.length, inPlots).map((middles) => {
    const added = makeSession(brief, points, middles, inPlots);
    const all = joinSessions(before, added);
    return { added, all, errorPlan: decideErrorAfter(kind, all) };
  });
  const session = sessions.find(({ errorPlan }) => hasEnoughError(errorPlan)) ?? sessions.at(-1);
  if (session === undefined) return [];
  const { added, all, errorPlan } = session;
  const known = listSeparateTerms(before);
  const seen = new Set(before.map((row) => row.x.join(' ')));
  return [
    {
      kind,
      added,
      runs: added.length,
      unties: listSeparateTerms(all).filter((term) => !known.includes(term)),
      aliases: findAliases(
        all.filter((row) => row.x.every((value) => Math.abs(value) === 1)).map((row) => row.x),
      ),
      errorPlan,
      newCombinations: added.filter((row) => !seen.has(row.x.join(' '))).map((row) => row.x),
      ...expectTimeAndMoney(brief, added),
    },
  ];
}

function joinSessions(before: readonly LayoutRow[], added: readonly LayoutRow[]): LayoutRow[] {
  const blocks = Math.max(...before.map((row) => row.block));
  const plots = Math.max(...before.map((row) => row.wholePlot ?? 0));
  const behind = added.map((row) => ({
    ...row,
    block: row.block + blocks,
    ...(row.wholePlot === undefined ? {} : { wholePlot: row.wholePlot + plots }),
  }));
  return [...before, ...behind];
}

/** With axial runs the columns left over hold the bends of single settings, so only repeats are error. */
function decideErrorAfter(kind: NextPlan['kind'], all: readonly LayoutRow[]): ErrorPlan {
  const plan = decideErrorPlan(lettersUpTo(all[0]?.x.length ?? 0), all);
  if (kind !== 'axial') return plan;
  const enough = plan.replicateDf >= 3;
  return {
    ...plan,
    rung: enough ? 'replicates' : 'none',
    df: enough ? plan.replicateDf : null,
    highOrderTerms: [],
  };
}

/** Turning round one setting, whole or half, such that the wanted term stands alone; the setting that unties most. */
function untie({
  brief,
  before,
  corners,
  wanted,
}: Omit<Session, 'kind' | 'points'> & { corners: readonly number[][]; wanted: string }): NextPlan[] {
  const letters = lettersUpTo(brief.factors.length);
  const folds = letters.flatMap((letter) =>
    addSession({ brief, before, kind: 'fold-on-one', points: foldCorners(brief, corners, [letter]) }).map(
      (plan) => ({ ...plan, letter }),
    ),
  );
  const [whole] = folds
    .filter((plan) => plan.unties.includes(wanted))
    .sort((first, second) => second.unties.length - first.unties.length);
  if (whole === undefined) return [];
  const points = foldCorners(brief, corners, [whole.letter]);
  const halves = letters.flatMap((letter, index) =>
    ([-1, 1] as const).flatMap((level) =>
      addSession({ brief, before, kind: 'half-fold', points: points.filter((x) => x[index] === level) }).map(
        (plan) => ({
          ...plan,
          letter: whole.letter,
          half: { letter, level },
        }),
      ),
    ),
  );
  const [half] = halves
    .filter((plan) => plan.unties.includes(wanted))
    .sort((first, second) => second.unties.length - first.unties.length);
  return half === undefined ? [whole] : [whole, half];
}
