import { describe, expect, test } from 'vitest';
import { anyBrief, buildBrief, numberFactor } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import type { Brief } from '../brief.ts';
import { groupBy } from './group-by.ts';
import { listIrregularStructures } from './irregular-structures.ts';
import { layOutRuns } from './lay-out-runs.ts';
import { PlanError } from './plan-error.ts';
import type { Proposal } from './proposal.ts';
import { proposePlans } from './propose-plans.ts';
import { reassignPair } from './reassign-letters.ts';
import { buildRegularPlan } from './regular-plan.ts';
import { listRegularStructures } from './regular-structures.ts';
import type { Structure } from './structure.ts';

const withHard = (settings: number, hard: readonly number[], more: Partial<Brief> = {}) =>
  buildBrief(0, {
    factors: Array.from({ length: settings }, (_, index) =>
      numberFactor(`setting ${index}`, { hardToChange: hard.includes(index) }),
    ),
    ...more,
  });

/** Every brief of one or two hard settings among so many, in one, two and four blocks. */
function listBriefs(settings: number): Brief[] {
  const indices = Array.from({ length: settings }, (_, index) => index);
  const choices = indices.flatMap((first) => [
    [first],
    ...indices.slice(first + 1).map((second) => [first, second]),
  ]);
  return choices.flatMap((hard) =>
    [1, 2, 4].map((count) =>
      withHard(settings, hard, count > 1 ? { blocks: { name: 'batch', kind: 'batch', count } } : {}),
    ),
  );
}

const indicesWhere = ({ factors }: Brief, isHard: boolean) =>
  factors.flatMap((factor, index) => ((factor.hardToChange ?? false) === isHard ? [index] : []));

type Plots = readonly (readonly { x: readonly number[] }[])[];

const cornerPlots = (rows: Structure['corners']): Plots =>
  groupBy(
    rows.filter((row) => !row.center),
    (row) => row.wholePlot,
  );

const changesIn = (plot: Plots[number], setting: number) =>
  plot.some((row) => row.x[setting] !== plot[0]?.x[setting]);

/** What is wrong with a grouping, in words for whoever reads a failure; empty where all is well. */
function listFaults(
  brief: Brief,
  plots: Plots,
  { judged, everywhere }: { judged: boolean; everywhere: boolean },
): string[] {
  const faults: string[] = [];
  for (const setting of indicesWhere(brief, false)) {
    const changing = plots.filter((plot) => changesIn(plot, setting)).length;
    if (changing === 0 || (everywhere && changing < plots.length))
      faults.push(`easy setting ${setting} changes in ${changing} of ${plots.length} whole plots`);
  }
  for (const setting of indicesWhere(brief, true)) {
    if (plots.some((plot) => changesIn(plot, setting))) faults.push(`hard setting ${setting} changes`);
    for (const level of [-1, 1]) {
      const count = plots.filter((plot) => plot[0]?.x[setting] === level).length;
      if (judged && count < 2) faults.push(`hard setting ${setting} has ${count} whole plots at ${level}`);
    }
  }
  return faults;
}

describe('in every regular plan with one or two hard settings', () => {
  test.each([2, 3, 4, 5, 6, 7])(
    'of %i: easy settings change within each whole plot, hard ones in none',
    (k) => {
      let grouped = 0;
      for (const brief of listBriefs(k)) {
        for (const { wholePlots, corners } of listRegularStructures(brief)) {
          if (wholePlots === undefined) continue;
          grouped++;
          const plots = cornerPlots(corners);
          expect(plots).toHaveLength(wholePlots.count);
          expect(listFaults(brief, plots, { judged: wholePlots.judged, everywhere: true })).toEqual([]);
        }
      }
      expect(grouped).toBeGreaterThan(k === 2 ? 5 : 20);
    },
  );

  test('two hard settings that multiply to a third are given other columns', () => {
    const grouped = (settings: number, hard: number[]) =>
      listRegularStructures(withHard(settings, hard)).find(
        ({ wholePlots, corners }) => wholePlots !== undefined && corners.length === 8,
      );
    // As listed, D=AB and E=AC.
    expect(grouped(5, [1, 2])?.generators).toEqual(['D=AB', 'E=AC']);
    const moved = grouped(5, [0, 1]);
    expect(moved?.generators).not.toEqual(['D=AB', 'E=AC']);
    expect(moved?.resolution).toBe(3);
    const tiedToBoth = moved?.aliases.find(({ with: others }) => others.some(({ term }) => term === 'AB'));
    expect(tiedToBoth?.term.length ?? 2).toBe(2);
    // Seven settings fill all columns of eight runs: any two multiply to a third.
    expect(grouped(7, [0, 1])).toBeUndefined();
    expect(grouped(7, [0])).toBeDefined();
  });

  test('plans whose columns moved have names of their own', () => {
    const ids = [
      [0, 1],
      [1, 2],
      [0, 3],
    ].flatMap((hard) =>
      proposePlans(withHard(5, hard, { budget: { maxRuns: 12 } })).map(
        ({ id, generators, layout }) => [id, JSON.stringify([generators, layout])] as const,
      ),
    );
    for (const [id, structure] of ids)
      expect(ids.filter(([other]) => other === id).every(([, same]) => same === structure)).toBe(true);
  });

  test('nothing is grouped where each whole plot would be a single run', () => {
    expect(listRegularStructures(withHard(2, [0, 1])).every(({ wholePlots }) => !wholePlots)).toBe(true);
    expect(listRegularStructures(withHard(1, [0])).every(({ wholePlots }) => !wholePlots)).toBe(true);
  });
});

describe('around forbidden corners', () => {
  test('every easy setting changes within some whole plot, each hard one has two whole plots a level or is called unjudged', () => {
    let grouped = 0;
    fc.assert(
      fc.property(anyBrief({ rules: 3 }), fc.nat(6), fc.nat(6), (drawn, first, second) => {
        if (drawn.forbidden.length === 0) return;
        const { blocks: _, ...rest } = drawn;
        const brief = { ...rest, factors: makeHard(drawn.factors, [first, second]) };
        for (const { wholePlots, corners } of listIrregularStructures(brief)) {
          if (wholePlots === undefined) continue;
          grouped++;
          const plots = cornerPlots(corners);
          expect(listFaults(brief, plots, { judged: wholePlots.judged, everywhere: false })).toEqual([]);
        }
      }),
      { numRuns: 80 },
    );
    expect(grouped).toBeGreaterThan(40);
  });
});

describe('what is proposed and laid out', () => {
  test('keeps to this run by run, and promises nothing on hard settings that it calls unjudged', () => {
    let grouped = 0;
    fc.assert(
      fc.property(anyBrief({ rules: 2 }), fc.nat(6), fc.nat(6), fc.nat(), (drawn, first, second, seed) => {
        const factors = makeHard(drawn.factors, [first, second]);
        const brief: Brief = { ...drawn, factors, budget: { maxRuns: 44 } };
        for (const proposal of tryPlans(brief)) {
          if (proposal.wholePlots === undefined) continue;
          grouped++;
          const runs = layOutRuns(brief, proposal, seed).filter((run) => !run.center);
          const plots = groupBy(runs, (run) => run.wholePlot).map((plot) =>
            plot.map(({ coded }) => ({ x: coded })),
          );
          const judged = !proposal.warnings.some(({ kind }) => kind === 'hard-setting-not-judged');
          expect(listFaults(brief, plots, { judged, everywhere: false })).toEqual([]);
          expect(proposal.detectable.some(({ effect }) => effect === 'hardToChange')).toBe(judged);
        }
      }),
      { numRuns: 60 },
    );
    expect(grouped).toBeGreaterThan(12);
  });
});

test('giving columns to other settings keeps the plan: the same pattern of words, the pair once on each two columns', () => {
  const listed = ['D=AB', 'E=-AC', 'F=BC'];
  const pattern = buildRegularPlan(6, listed).wordLengthPattern;
  const assignments = reassignPair(6, listed, [1, 4]);
  expect(assignments).toHaveLength(15);
  expect(assignments[0]).toEqual(listed);
  for (const generators of assignments)
    expect(buildRegularPlan(6, generators).wordLengthPattern).toEqual(pattern);
});

function makeHard(factors: Brief['factors'], hard: readonly number[]): Brief['factors'] {
  const wanted = hard.map((index) => index % factors.length);
  return factors.map((factor, index) => ({ ...factor, hardToChange: wanted.includes(index) }));
}

function tryPlans(brief: Brief): Proposal[] {
  try {
    return proposePlans(brief);
  } catch (error) {
    if (error instanceof PlanError) return [];
    throw error;
  }
}
