import { describe, expect, test } from 'vitest';
import { buildBrief } from '../../../../tests/builders/brief.ts';
import { createUniformSource } from '../random/random-numbers.ts';
import { listAllowedCorners } from './allowed-corners.ts';
import { expandPoint, invertInformation, invertPositive } from './information.ts';
import { findIrregularPlans } from './irregular-plan.ts';
import { findOptimalSubsets } from './optimal-subset.ts';
import { splitEvenly } from './split-evenly.ts';

const corners = listAllowedCorners(buildBrief(4, { forbidden: [{ A: 1, B: 1 }] }));
const rows = corners.map((x) => expandPoint(x, ['A', 'B', 'C', 'D']));

/** Determinant of X'X by elimination: another way than the search goes. */
function determinant(chosen: readonly number[]): number {
  const matrix = [0, 1, 2, 3, 4].map((i) =>
    [0, 1, 2, 3, 4].map((j) =>
      chosen.reduce((sum, row) => sum + (rows[row]?.[i] ?? 0) * (rows[row]?.[j] ?? 0), 0),
    ),
  );
  let product = 1;
  for (const [step, pivot] of matrix.entries()) {
    const head = pivot[step] ?? 0;
    // X'X is never indefinite, so a pivot of zero means a determinant of zero.
    if (head < 1e-9) return 0;
    product *= head;
    for (const line of matrix.slice(step + 1)) {
      const share = (line[step] ?? 0) / head;
      for (const [column, value] of pivot.entries()) line[column] = (line[column] ?? 0) - share * value;
    }
  }
  return product;
}

function* allSubsets(size: number, from = 0, chosen: readonly number[] = []): Generator<readonly number[]> {
  if (chosen.length === size) {
    yield chosen;
    return;
  }
  // From the same index again: a point may be taken twice.
  for (let index = from; index < rows.length; index++) yield* allSubsets(size, index, [...chosen, index]);
}

describe('D-optimal subsets', () => {
  test.each([5, 6])('of 12 corners, %i runs: no subset of all is better', (size) => {
    const [best] = findOptimalSubsets({ candidates: rows, size, random: createUniformSource(1), starts: 5 });
    let most = 0;
    for (const subset of allSubsets(size)) most = Math.max(most, determinant(subset));
    expect(determinant(best?.chosen ?? [])).toBeCloseTo(most, 6);
  });

  test('of all corners are as good as an orthogonal plan', () => {
    const all = listAllowedCorners(buildBrief(4)).map((x) => expandPoint(x, ['A', 'B', 'C', 'D']));
    const [best] = findOptimalSubsets({
      candidates: all,
      size: 8,
      random: createUniformSource(1),
      starts: 5,
    });
    const inverse = invertInformation((best?.chosen ?? []).map((index) => all[index] ?? []));
    for (const [index, line] of (inverse ?? []).entries()) expect(line[index]).toBeCloseTo(1 / 8, 9);
  });

  test('are none where no subset determines the model', () => {
    const flat = corners.filter((x) => x[0] === -1).map((x) => expandPoint(x, ['A', 'B']));
    expect(
      findOptimalSubsets({ candidates: flat, size: 6, random: createUniformSource(1), starts: 3 }),
    ).toEqual([]);
    expect(
      findOptimalSubsets({ candidates: rows, size: 4, random: createUniformSource(1), starts: 3 }),
    ).toEqual([]);
  });

  test('report efficiencies and aliases that simulated data bear out', () => {
    for (const plan of findIrregularPlans(buildBrief(4, { forbidden: [{ A: 1, B: 1 }] }), 32)) {
      const model = plan.corners.map((x) => expandPoint(x, plan.terms));
      const inverse = invertInformation(model) ?? [];
      for (const [index, { relative }] of plan.efficiencies.entries())
        expect(relative).toBeCloseTo(1 / (plan.corners.length * (inverse[index + 1]?.[index + 1] ?? 0)), 9);
      // Data that are one left-out pair alone: each estimate is its alias coefficient.
      const readings = plan.corners.map((x) => expandPoint(x, ['AB'])[1] ?? 0);
      for (const [index, term] of plan.terms.entries()) {
        const estimate = (inverse[index + 1] ?? []).reduce(
          (sum, value, j) =>
            sum + value * model.reduce((inner, row, run) => inner + (row[j] ?? 0) * (readings[run] ?? 0), 0),
          0,
        );
        const named = plan.aliases
          .find((alias) => alias.term === term)
          ?.with.find((partner) => partner.term === 'AB');
        expect(named?.coefficient ?? 0).toBeCloseTo(estimate, 9);
      }
    }
  });
});

test('a matrix times its inverse is one; a singular one has none', () => {
  const matrix = [
    [4, 1, 0],
    [1, 3, 1],
    [0, 1, 2],
  ];
  const inverse = invertPositive(matrix) ?? [];
  for (const [i, line] of matrix.entries())
    for (let j = 0; j < 3; j++)
      expect(line.reduce((sum, value, m) => sum + value * (inverse[m]?.[j] ?? 0), 0)).toBeCloseTo(
        i === j ? 1 : 0,
        12,
      );
  expect(
    invertPositive([
      [1, 1],
      [1, 1],
    ]),
  ).toBeNull();
});

test('rows are split evenly without leaning where that can be', () => {
  const columns = [0, 1, 2].map((setting) => listAllowedCorners(buildBrief(3)).map((x) => x[setting] ?? 0));
  const parts = splitEvenly(columns, 8, 2);
  expect(parts.filter((part) => part === 0)).toHaveLength(4);
  for (const column of columns)
    expect(column.reduce((sum, value, row) => sum + (parts[row] === 0 ? value : 0), 0)).toBe(0);
});
