import { listTerms, termColumn } from '../analysis/terms.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { indicatorColumns } from '../linear-algebra/indicators.ts';
import { hasPseudoErrorLimits } from '../tables/pseudo-error-limits.ts';
import type { ErrorPlan, ErrorRung, ErrorStratum } from './proposal.ts';
import { isRegularComplete } from './regular-layout.ts';

/** What the error plan looks at: where the runs are, never what they gave. */
export interface LayoutRun {
  /** Coded settings, as analyzed. */
  x: readonly number[];
  center?: boolean;
  block?: number;
  wholePlot?: number;
}

/** With fewer degrees of freedom than this the limits of t are too wide to be of use, and pseudo error does better where it is allowed. */
const ENOUGH_DF = 3;

/**
 * Where the error of the effects comes from, decided from the layout alone.
 *
 * Error is what is left of the runs after blocks, one column for each set of middle runs, and all terms of one and two letters: pure error from
 * repeats plus free columns of order three and up. With whole plots each stratum has its own.
 */
export function decideErrorPlan(letters: readonly string[], runs: readonly LayoutRun[]): ErrorPlan {
  const columnOf = (term: string) => termColumn(term, letters, runs);
  const question = {
    terms: listTerms(letters, letters.length),
    columnOf,
    middles: middleColumns(runs),
    combinations: indicatorColumns(runs.map((run) => run.x.join(' '))),
    regular: isRegularComplete(runs),
  };
  const blocks = indicatorColumns(runs.map((run) => run.block));
  const plan = decideFromSpaces({ ...question, units: blocks, fewestDf: ENOUGH_DF });
  if (runs.every((run) => run.wholePlot === undefined)) return plan;

  // A stratum with one or two degrees of freedom keeps its wide interval: nothing else can judge its effects.
  const plots = indicatorColumns(runs.map((run) => run.wholePlot));
  const sub = decideFromSpaces({ ...question, units: plots, fewestDf: 1 });
  const averaged = (column: readonly number[]) => plots.map((plot) => averageOver(plot, column));
  const whole = decideFromSpaces({
    terms: question.terms.filter((term) => isConstantWithin(plots, columnOf(term))),
    columnOf: (term) => averaged(columnOf(term)),
    middles: question.middles.map(averaged),
    combinations: indicatorColumns(plots.map((plot) => compositionOf(plot, runs))),
    regular: false,
    units: blocks.map(averaged),
    fewestDf: 1,
  });
  return { ...plan, strata: [pickStratum('whole', whole), pickStratum('sub', sub)] };
}

function pickStratum(name: ErrorStratum['name'], plan: ErrorPlan): ErrorStratum {
  const { rung, df, replicateDf, highOrderTerms } = plan;
  return { name, rung, df, replicateDf, highOrderTerms };
}

interface SpaceQuestion {
  /** In the order in which they may enter. */
  terms: readonly string[];
  columnOf: (term: string) => readonly number[];
  /** Columns that take out the differences between blocks or whole plots. */
  units: number[][];
  /** One column for each set of middle runs, so that bends never count as error. */
  middles: number[][];
  /** One column for each different combination of settings. */
  combinations: number[][];
  regular: boolean;
  fewestDf: number;
}

function decideFromSpaces(question: SpaceQuestion): ErrorPlan {
  const { terms, columnOf, units, middles, combinations, regular, fewestDf } = question;
  const rows = units[0]?.length ?? 0;
  const replicateDf = rows - createColumnSpace([...units, ...combinations]).rank;
  const space = createColumnSpace([...units, ...middles]);
  const tested = terms.filter((term) => term.length <= 2 && space.add(columnOf(term)));
  const df = rows - space.rank;
  // Functions of the settings cannot fill more than what repeats leave; asking on would only cost time.
  const highOrderTerms = terms.filter(
    (term) => term.length > 2 && rows - space.rank > replicateDf && space.add(columnOf(term)),
  );
  const mayUsePseudo = regular && df < ENOUGH_DF;
  const contrasts = mayUsePseudo ? countCornerContrasts(question) : tested.length + highOrderTerms.length;
  const pseudo = mayUsePseudo && hasPseudoErrorLimits({ contrasts, replicateDf });
  const rung = chooseRung({ df, replicateDf, fewestDf, pseudo });
  const hasDf = rung === 'replicates' || rung === 'replicates+high-order';
  return { rung, df: hasDf ? df : null, replicateDf, highOrderTerms, contrasts };
}

/**
 * Contrasts among the corner runs alone. Middle runs in every block make a contrast that blocks hide estimable, but by the middles' difference and never
 * as well as the others: it is no yardstick for them.
 */
function countCornerContrasts({ terms, columnOf, units, middles }: SpaceQuestion): number {
  const isCorner = (_: number, row: number) => middles.every((middle) => middle[row] === 0);
  const space = createColumnSpace(units.map((unit) => unit.filter(isCorner)));
  return terms.filter((term) => space.add(columnOf(term).filter(isCorner))).length;
}

function chooseRung(known: {
  df: number;
  replicateDf: number;
  fewestDf: number;
  pseudo: boolean;
}): ErrorRung {
  const { df, replicateDf, fewestDf, pseudo } = known;
  const byDf = df > replicateDf ? 'replicates+high-order' : 'replicates';
  if (df >= ENOUGH_DF) return byDf;
  if (pseudo) return replicateDf > 0 ? 'pseudo+replicates' : 'pseudo';
  return df >= fewestDf ? byDf : 'none';
}

export function middleColumns(runs: readonly LayoutRun[]): number[][] {
  const sets = new Set(runs.filter((run) => run.center).map((run) => run.x.join(' ')));
  return [...sets].map((set) => runs.map((run) => (run.center && run.x.join(' ') === set ? 1 : 0)));
}

/** Average of a column over the runs of a whole plot. */
export function averageOver(plot: readonly number[], column: readonly number[]): number {
  let sum = 0;
  let members = 0;
  for (let row = 0; row < column.length; row++) {
    if (plot[row] !== 1) continue;
    sum += column[row] ?? 0;
    members++;
  }
  return sum / members;
}

/** Whether a column does not change inside any of the units. */
export function isConstantWithin(units: readonly (readonly number[])[], column: readonly number[]): boolean {
  return units.every((unit) => {
    let first: number | undefined;
    for (let row = 0; row < column.length; row++) {
      if (unit[row] !== 1) continue;
      const value = column[row] ?? 0;
      first ??= value;
      if (Math.abs(value - first) >= 1e-9) return false;
    }
    return true;
  });
}

function compositionOf(plot: readonly number[], runs: readonly LayoutRun[]): string {
  return runs
    .filter((_, row) => plot[row] === 1)
    .map((run) => run.x.join(' '))
    .sort()
    .join('; ');
}
