// npm run bench:verdict [-- worth confirmation calibration calls promises counts timing] : simulations behind the verdict, written to tests/reports.
import { writeFileSync } from 'node:fs';
import { REGULARITIES } from '../../../src/lib/doe/advice/effect-regularities.ts';
import { calibrate, shareCalls } from './calibration.ts';
import { simulateConfirmation, simulateNoGain } from './confirmation.ts';
import { falseLikelyOfRejects } from './counts.ts';
import { PLANS, WHOLE_PLOT_PLANS } from './plans.ts';
import { listProposals, simulatePromise } from './promises.ts';
import { asShare, createRandomSource, markdownTable } from './simulation.ts';
import { measureTimings } from './timing.ts';
import { CELLS, measureWorth, STRATEGIES } from './worth.ts';

const SEED = 20_260_401;

function report(name: string, title: string, about: string, table: string): void {
  const file = new URL(`../../reports/verdict-${name}.md`, import.meta.url);
  writeFileSync(file, `# ${title}\n\n${about}\n\n${table}\n`);
  console.log(`tests/reports/verdict-${name}.md`);
}

function worth(): void {
  const processes = 4000;
  const rows = CELLS.map((cell) => {
    const { shares, pairedError } = measureWorth({ cell, processes, random: createRandomSource(SEED) });
    const difference = shares.bestBet - shares.shrunken;
    return [
      `${cell.factors}, ${cell.runs}`,
      cell.noise,
      ...STRATEGIES.map((name) => asShare(shares[name], 1)),
      `${difference.toFixed(4)} +- ${pairedError.toFixed(4)}`,
    ];
  });
  report(
    'worth',
    'Share of the possible improvement',
    `${processes} simulated processes a cell, seed ${SEED}; regularities of Li, Sudarsanam & Frey (2006); center 0, best corner of the true process 1. *shrunken* knows noise and effect size, *bestBet* does not; the last column is their paired difference.`,
    markdownTable(['settings, runs', 'noise', ...STRATEGIES, 'bestBet - shrunken'], rows),
  );
  const worlds = {
    'mains active 20 %': { ...REGULARITIES, mainActive: 0.2 },
    'mains active 70 %': { ...REGULARITIES, mainActive: 0.7 },
    'no heredity': {
      ...REGULARITIES,
      pairActive: [0.08, 0.08, 0.08],
      tripleActive: [0.02, 0.02, 0.02, 0.02],
    },
    'interactions as large as mains': { ...REGULARITIES, size: [0, 1, 1, 1] },
  };
  const robust = Object.entries(worlds).flatMap(([world, rules]) =>
    CELLS.map((cell) => {
      const { shares } = measureWorth({ cell, processes: 2000, random: createRandomSource(SEED + 1), rules });
      return [
        world,
        `${cell.factors}, ${cell.runs}`,
        cell.noise,
        ...STRATEGIES.map((name) => asShare(shares[name], 1)),
        (shares.bestBet - shares.allEstimates).toFixed(4),
      ];
    }),
  );
  report(
    'robustness',
    'The same in other worlds',
    `2000 simulated processes a cell, seed ${SEED + 1}; the regularities differ from those that the best bet expects.`,
    markdownTable(['world', 'settings, runs', 'noise', ...STRATEGIES, 'bestBet - allEstimates'], robust),
  );
}

function confirmation(): void {
  const trials = 5000;
  const rows = [0.25, 0.5, 1, 2].map((noise) => {
    const found = simulateConfirmation({ trials, noise, random: createRandomSource(SEED + 2) });
    return [
      noise,
      asShare(found.covered, trials),
      asShare(found.effectsCovered, found.effects),
      found.notBetter,
      asShare(found.falselyHeld, found.notBetter),
    ];
  });
  const noGain = [0, 2].map((dayShift) => {
    const held = simulateNoGain({ trials, random: createRandomSource(SEED + 3), dayShift });
    return [`no gain, day shift ${dayShift} sd`, '', '', trials, asShare(held, trials)];
  });
  report(
    'confirmation',
    'Check runs',
    `${trials} trials a row, seeds ${SEED + 2} and ${SEED + 3}: 2^(4-1) + 4 middles on processes by the published regularities, then three check runs of each kind. "range": observed gain inside the predicted range; "effects": true effects inside their 95 % intervals; then trials whose true gain is not above zero, and the share of those called *held*.`,
    markdownTable(['noise', 'range', 'effects', 'no true gain', 'falsely held'], [...rows, ...noGain]),
  );
}

function calibration(): void {
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
    `${experiments} experiments a row, seed ${SEED + 4}; active effects of three run-to-run standard deviations from low to high, drawn anew among all contrasts in each experiment.`,
    markdownTable(
      ['plan', 'error', 'active', 'likely of a null', 'any clear of nulls', 'coverage', 'power'],
      rows,
    ),
  );
}

function calls(): void {
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

function promises(): void {
  const trials = 4000;
  const rows = listProposals().flatMap((proposal) => {
    const power = simulatePromise(proposal, trials, createRandomSource(SEED + 6));
    const promise = proposal.detectable.find(({ effect }) => effect === 'easy');
    if (power === null || promise === undefined) return [];
    return [
      [
        proposal.k,
        proposal.runs,
        proposal.generators.join(' '),
        proposal.centerPoints,
        proposal.errorPlan.rung,
        promise.assumedActive,
        promise.size.toFixed(3),
        power.toFixed(3),
      ],
    ];
  });
  report(
    'promises',
    'Power at the size promised',
    `${trials} trials a plan, seed ${SEED + 6} (standard error .006): share of *likely* about a main effect of exactly the promised size; .80 was promised.`,
    markdownTable(
      ['settings', 'runs', 'generators', 'middles', 'error', 'assumed active', 'size', 'power'],
      rows,
    ),
  );
}

function counts(): void {
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
    `${experiments} experiments a row, seed ${SEED + 7}; nothing is active.`,
    markdownTable(['plan', 'lot', 'rate', 'correlation within a lot', 'likely of a null'], rows),
  );
}

function timing(): void {
  report(
    'timing',
    'Time once warm',
    'Milliseconds, 400 repetitions: shortest and median. The shortest is what the code needs; the median is what a busy machine gave it.',
    markdownTable(['trial', 'analyze', 'judge', 'bestBet', 'all, shortest'], measureTimings()),
  );
}

const tables = { worth, confirmation, calibration, calls, promises, counts, timing };
const wanted = process.argv.slice(2);
for (const [name, make] of Object.entries(tables)) if (wanted.length === 0 || wanted.includes(name)) make();
