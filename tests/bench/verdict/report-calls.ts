import { calibrate, coverProcesses, shareCalls } from './calibration.ts';
import { falseLikelyOfRejects } from './counts.ts';
import { PLANS, WHOLE_PLOT_PLANS } from './plans.ts';
import { report, SEED } from './report.ts';
import { asShare, createRandomSource, markdownTable } from './simulation.ts';

export function reportCalibration(): void {
  const experiments = 20_000;
  const scenarios = [
    ...PLANS.flatMap((plan) => plan.active.map((active) => ({ plan, active, plotSd: 0 }))),
    ...[0.5, 2].flatMap((plotSd) =>
      WHOLE_PLOT_PLANS.flatMap((plan) => plan.active.map((active) => ({ plan, active, plotSd }))),
    ),
  ];
  const rows = scenarios.map(({ plan, active, plotSd }) => {
    const found = calibrate({
      plan,
      active,
      size: 3,
      experiments,
      random: createRandomSource(SEED + 4),
      plotSd,
    });
    return [
      plotSd > 0 ? `${plan.name}, sd between plots ${plotSd}` : plan.name,
      found.source,
      active,
      asShare(found.falseLikely, found.nulls),
      asShare(found.anyFalseClear, experiments),
      asShare(found.covered, found.intervals),
      active > 0 ? asShare(found.seen, experiments) : '',
    ];
  });
  report(
    'calibration',
    'False calls, coverage, power',
    `${experiments} experiments a row, seed ${SEED + 4}; active effects of three run-to-run standard deviations from low to high, drawn anew among all contrasts in each experiment. Pseudo error and its sub strata are cautious with many active: their limits promise at most 5 %.`,
    markdownTable(
      ['plan', 'error', 'active', 'likely of a null', 'any clear of nulls', 'coverage', 'power'],
      rows,
    ),
  );
}

export function reportCoverage(): void {
  const experiments = 5000;
  const rows = PLANS.map((plan) => [
    plan.name,
    ...[0.25, 1].map((noise) => {
      const random = createRandomSource(SEED + 8);
      const { covered, intervals } = coverProcesses({ plan, noise, experiments, random });
      return asShare(covered, intervals);
    }),
  ]);
  report(
    'coverage',
    'Coverage over processes',
    `${experiments} processes a cell, seed ${SEED + 8}; regularities of Li, Sudarsanam & Frey (2006), interactions up to order three. Share of 95 % intervals that hold the true effect with all that is tied to it; noise in standard deviations of an active main effect.`,
    markdownTable(['plan', 'noise 0.25', 'noise 1'], rows),
  );
}

export function reportCalls(): void {
  const experiments = 20_000;
  const kinds = ['matters', 'real-but-small', 'no-real-difference', 'cant-tell'];
  const rows = PLANS.filter(({ rung }) => rung !== 'pseudo')
    .slice(0, 7)
    .flatMap((plan) =>
      [0, 0.5, 1, 1.5, 2].map((multiple) => {
        const shares = shareCalls({
          plan,
          size: 3 * multiple,
          worthHaving: 3,
          experiments,
          random: createRandomSource(SEED + 5),
        });
        return [
          plan.name,
          `${multiple} W`,
          ...kinds.map((kind) => asShare(shares.get(kind) ?? 0, experiments)),
        ];
      }),
    );
  report(
    'calls',
    'The four calls by true effect',
    `${experiments} experiments a row, seed ${SEED + 5}; W is three run-to-run standard deviations, one other effect of 2 W is active. For number settings the verdict also asks that the middle be on the line before it says that there is no real difference.`,
    markdownTable(['plan', 'true effect', ...kinds], rows),
  );
}

export function reportCounts(): void {
  const experiments = 20_000;
  const rows = ['2^4 + 3 middles', '2^(4-1) + 4 middles', '2^(4-1)'].flatMap((planName) =>
    [
      { lot: 20, rate: 0.05 },
      { lot: 50, rate: 0.04 },
      { lot: 50, rate: 0.2 },
      { lot: 200, rate: 0.1 },
    ].flatMap(({ lot, rate }) =>
      [0, 0.02].map((correlation) => [
        planName,
        lot,
        rate,
        correlation,
        falseLikelyOfRejects({
          lot,
          rate,
          correlation,
          planName,
          experiments,
          random: createRandomSource(SEED + 7),
        })
          .toFixed(4)
          .replace(/^0/, ''),
      ]),
    ),
  );
  report(
    'counts',
    'Rejects: likely of a null effect',
    `${experiments} experiments a row, seed ${SEED + 7}; nothing is active, and every term of each experiment is counted (standard error at most .0016 if all terms of an experiment moved together).`,
    markdownTable(['plan', 'lot', 'rate', 'correlation within a lot', 'likely of a null'], rows),
  );
}
