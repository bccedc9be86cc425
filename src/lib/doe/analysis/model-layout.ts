import { middleColumns } from '../design/error-plan.ts';
import type { Alias } from '../design/proposal.ts';
import { createColumnSpace } from '../linear-algebra/column-space.ts';
import { type FactoredModel, factorModel } from '../linear-algebra/least-squares.ts';
import { findAliases } from './aliases.ts';
import type { Layout } from './layout.ts';
import { listTerms, termColumn } from './terms.ts';

/** A model for given runs: which columns it has and what each term can and cannot be told apart from. */
export interface ModelLayout {
  /** Intercept, blocks, curvature if present, terms. */
  columns: (readonly number[])[];
  blockColumns: number;
  hasCurvature: boolean;
  terms: string[];
  notEstimable: string[];
  aliases: Alias[];
  confoundedWithBlocks: string[];
  model: FactoredModel;
  /** Place of a term's column. */
  columnOf(term: string): number;
}

export interface ModelQuestion {
  layout: Layout;
  /** In the order in which they may enter. */
  terms: readonly string[];
  curvature: boolean;
  /** false: aliases and terms confounded with blocks are not asked for. */
  withAliases?: boolean;
}

/** The estimable part of the model asked for: a term that depends on blocks or on terms before it stays out and is named. */
export function layOutModel(question: ModelQuestion): ModelLayout {
  const { layout, terms, curvature, withAliases = true } = question;
  const name = `model ${terms.join(' ')} ${curvature} ${withAliases}`;
  return layout.remember(name, () => buildModel({ ...question, withAliases }));
}

function buildModel({ layout, terms, curvature, withAliases }: Required<ModelQuestion>): ModelLayout {
  const { letters, points: runs, weights } = layout;
  const ones = runs.map(() => 1);
  const space = createColumnSpace([ones]);
  const blocks = unitContrasts(runs.map((run) => run.block)).filter((column) => space.add(column));
  const blockSpace = createColumnSpace([ones, ...blocks]);
  const middle = runs.map((run) => (run.center ? 1 : 0));
  const hasCurvature = curvature && space.add(middle);

  const valueColumn = (term: string) => termColumn(term, letters, runs);
  // Two terms that are tied on the corners are not told apart by middle runs at two values of a choice: those are for the bend.
  const cornerSpace = createColumnSpace([ones, ...blocks, ...middleColumns(runs)]);
  const onCorners = (term: string, column: readonly number[]) =>
    new Set(term).size < term.length || cornerSpace.add(column);
  const kept: { term: string; column: readonly number[] }[] = [];
  const notEstimable: string[] = [];
  for (const term of terms) {
    const column = valueColumn(term);
    if (onCorners(term, column) && space.add(column)) kept.push({ term, column });
    else notEstimable.push(term);
  }
  const columns = [ones, ...blocks, ...(hasCurvature ? [middle] : []), ...kept.map(({ column }) => column)];
  const firstTerm = columns.length - kept.length;
  const model = factorModel(columns, weights);
  const placeOf = (term: string) => firstTerm + kept.findIndex((entry) => entry.term === term);

  const estimable = {
    columns,
    blockColumns: blocks.length,
    hasCurvature,
    terms: kept.map(({ term }) => term),
    notEstimable,
    model,
    columnOf: placeOf,
  };
  if (!withAliases) return { ...estimable, aliases: [], confoundedWithBlocks: [] };

  const inModel = new Set(kept.map(({ term }) => term));
  const others = listTerms(letters, letters.length)
    .filter((term) => !inModel.has(term))
    .map((term) => ({ term, column: valueColumn(term) }));
  const confounded = blocks.length === 0 ? [] : others.filter(({ column }) => blockSpace.spans(column));
  return {
    ...estimable,
    confoundedWithBlocks: confounded.map(({ term }) => term),
    aliases: findAliases({
      kept,
      others: others.filter((other) => !confounded.includes(other)),
      columns,
      model,
      firstTerm,
      weighted: weights !== undefined,
      corners: runs.flatMap((run, row) => (run.center ? [] : [row])),
    }),
  };
}

/** Blocks or whole plots as columns that sum to zero over them, so that the intercept is the average over blocks. */
export function unitContrasts(units: readonly (number | undefined)[]): number[][] {
  const different = [...new Set(units)];
  const last = different.at(-1);
  return different
    .slice(0, -1)
    .map((unit) => units.map((other) => (other === unit ? 1 : other === last ? -1 : 0)));
}
