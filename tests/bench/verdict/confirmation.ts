import { bestBet } from '../../../src/lib/doe/advice/best-bet.ts';
import { judgeConfirmation } from '../../../src/lib/doe/advice/judge-confirmation.ts';
import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { drawProcess, regularPlan } from '../../builders/random-process.ts';
import { buildBrief, buildInput } from '../../builders/simulated-trial.ts';
import type { RandomSource } from './simulation.ts';

export interface ConfirmationFigures {
  trials: number;
  /** Observed gain of the check runs inside the predicted range. */
  covered: number;
  /** Trials whose true gain is zero or less, and those called *held*. */
  notBetter: number;
  falselyHeld: number;
  /** True effects inside their 95 % interval. */
  effects: number;
  effectsCovered: number;
}

/** Trials of processes drawn by the published regularities, each followed by three check runs of each kind. */
export function simulateConfirmation(question: {
  trials: number;
  noise: number;
  random: RandomSource;
}): ConfirmationFigures {
  const { trials, noise, random } = question;
  const letters = [...'ABCD'];
  const points = [...regularPlan(3, [[0, 1, 2]]), ...Array.from({ length: 4 }, () => [0, 0, 0, 0])];
  const brief = buildBrief(4, {
    response: { name: 'result', unit: '', kind: 'measured', goal: 'more', worthHaving: 1e-9 },
  });
  const found = { trials, covered: 0, notBetter: 0, falselyHeld: 0, effects: 0, effectsCovered: 0 };
  for (let trial = 0; trial < trials; trial++) {
    const process = drawProcess(letters, random);
    const read = (x: readonly number[]) => process.valueAt(x) + noise * random.normal();
    const input = buildInput(
      brief,
      points.map((x) => ({ x, y: read(x) })),
    );
    const analysis = analyze(input);
    const bet = bestBet(brief, [{ spec: brief.response, input, analysis }]);
    const three = (x: readonly number[]) => Array.from({ length: 3 }, () => read(x));
    const usual = [0, 0, 0, 0];
    const verdict = judgeConfirmation(brief, bet, { atBest: three(bet.coded), atUsual: three(usual) });
    if (verdict.predicted[0] <= verdict.gain && verdict.gain <= verdict.predicted[1]) found.covered++;
    if (process.valueAt(bet.coded) <= 0) {
      found.notBetter++;
      if (verdict.outcome === 'held') found.falselyHeld++;
    }
    for (const term of analysis.terms) {
      const members = [term.term, ...term.aliasedWith];
      const truth = members.reduce(
        (sum, member) => sum + 2 * (process.coefficients[process.terms.indexOf(member)] ?? 0),
        0,
      );
      if (term.ci === null) continue;
      found.effects++;
      if (term.ci[0] <= truth && truth <= term.ci[1]) found.effectsCovered++;
    }
  }
  return found;
}

/** *held* where the new settings are no better than usual: check runs of pure noise around equal means. */
export function simulateNoGain(question: { trials: number; random: RandomSource; dayShift: number }): number {
  const { trials, random, dayShift } = question;
  const brief = buildBrief(4, {
    response: { name: 'result', unit: '', kind: 'measured', goal: 'more', worthHaving: 1e-9 },
  });
  const points = [...regularPlan(3, [[0, 1, 2]]), ...Array.from({ length: 4 }, () => [0, 0, 0, 0])];
  let held = 0;
  for (let trial = 0; trial < trials; trial++) {
    const input = buildInput(
      brief,
      points.map((x) => ({ x, y: random.normal() })),
    );
    const bet = bestBet(brief, [{ spec: brief.response, input, analysis: analyze(input) }]);
    const three = () => Array.from({ length: 3 }, () => dayShift + random.normal());
    if (judgeConfirmation(brief, bet, { atBest: three(), atUsual: three() }).outcome === 'held') held++;
  }
  return held;
}
