import { describe, expect, test } from 'vitest';
import { factorialExamples } from '../../../../tests/builders/reference-examples.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import { catalogue } from './catalogue.ts';
import { buildRegularPlan, listAliases, multiply } from './regular-plan.ts';
import { findAliases } from './trace-aliases.ts';
import { readWord } from './words.ts';

/** Any plan of the catalogue with any signs. */
const anyPlan = fc
  .record({ entry: fc.constantFrom(...catalogue), signs: fc.integer({ min: 0, max: 15 }) })
  .map(({ entry, signs }) =>
    buildRegularPlan(
      entry.k,
      entry.generators.map((generator, index) =>
        (signs >> index) & 1 ? generator.replace('=', '=-') : generator,
      ),
    ),
  );

describe('every regular plan', () => {
  test('has columns that are balanced and orthogonal, one for each contrast', () => {
    fc.assert(
      fc.property(anyPlan, ({ chains, corners }) => {
        expect(chains).toHaveLength(corners.length - 1);
        const columns = chains.map(([first = 0]) => corners.map((x) => multiply(first, x)));
        for (const [index, column] of columns.entries()) {
          expect(column.reduce((sum, value) => sum + value, 0)).toBe(0);
          for (const other of columns.slice(index + 1))
            expect(column.reduce((sum, value, run) => sum + value * (other[run] ?? 0), 0)).toBe(0);
        }
      }),
      { numRuns: 60 },
    );
  });

  test('has aliases that are what their signs say, in every corner', () => {
    fc.assert(
      fc.property(anyPlan, (plan) => {
        for (const { term, with: partners } of listAliases(plan))
          for (const partner of partners)
            for (const x of plan.corners)
              expect(multiply(readWord(partner.term), x) * partner.coefficient).toBe(
                multiply(readWord(term), x),
              );
      }),
      { numRuns: 60 },
    );
  });

  test('has aliases of aliases that agree: each term in one chain, signs multiplying', () => {
    fc.assert(
      fc.property(anyPlan, (plan) => {
        const aliases = listAliases(plan);
        const members = aliases.flatMap(({ term, with: partners }) => [
          term,
          ...partners.map((partner) => partner.term),
        ]);
        expect(new Set(members).size).toBe(members.length);
        const signOf = new Map(plan.definingWords.map(({ word, sign }) => [word, sign]));
        for (const { with: partners } of aliases) {
          for (const first of partners) {
            for (const second of partners) {
              if (first === second) continue;
              const between = signOf.get(readWord(first.term) ^ readWord(second.term));
              expect(first.coefficient * second.coefficient).toBe(between);
            }
          }
        }
      }),
      { numRuns: 60 },
    );
  });

  test('is recognised from its corners alone, in any order', () => {
    fc.assert(
      fc.property(anyPlan, (plan) => {
        expect(findAliases(plan.corners.toReversed())).toEqual(listAliases(plan));
      }),
      { numRuns: 40 },
    );
  });
});

describe('aliases of published experiments (sources in each file)', () => {
  const fractions = factorialExamples.filter(({ computed }) =>
    Object.values(computed.design?.aliases ?? {}).some((partners) => partners.length > 0),
  );

  test.each(fractions)('$id: $source', ({ runs, factors, computed }) => {
    const letters = (factors ?? []).map(({ letter }) => letter);
    const corners = runs
      .filter((run) => run.centre !== true)
      .map((run) => letters.map((letter) => Math.sign(run.coded?.[letter] ?? 0)));
    const found = findAliases(corners);
    const signed = found.map(({ term, with: partners }) => [
      term,
      partners.map((partner) => `${partner.coefficient < 0 ? '-' : ''}${partner.term}`),
    ]);
    expect(Object.fromEntries(signed)).toEqual(computed.design?.aliases);
  });
});
