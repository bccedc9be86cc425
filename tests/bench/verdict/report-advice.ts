import { REGULARITIES } from '../../../src/lib/doe/advice/effect-regularities.ts';
import { simulateConfirmation, simulateNoGain } from './confirmation.ts';
import { report, SEED } from './report.ts';
import { asShare, createRandomSource, markdownTable } from './simulation.ts';
import { CELLS, measureWorth, STRATEGIES } from './worth.ts';

export function reportWorth(): void {
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

export function reportConfirmation(): void {
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
  const equalTrials = 20_000;
  const noGain = [0, 2].map((dayShift) => {
    const held = simulateNoGain({ trials: equalTrials, random: createRandomSource(SEED + 3), dayShift });
    return [`no gain, day shift ${dayShift} sd`, '', '', equalTrials, asShare(held, equalTrials)];
  });
  report(
    'confirmation',
    'Check runs',
    `${trials} trials a row (${equalTrials} without any gain: standard error .0011), seeds ${SEED + 2} and ${SEED + 3}: 2^(4-1) + 4 middles on processes by the published regularities, then three check runs of each kind. "range": observed gain inside the predicted range; "effects": true effects inside their 95 % intervals; then trials whose true gain is not above zero, and the share of those called *held*.`,
    markdownTable(['noise', 'range', 'effects', 'no true gain', 'falsely held'], [...rows, ...noGain]),
  );
}
