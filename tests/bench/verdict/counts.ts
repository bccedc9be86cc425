import type { Scale } from '../../../src/lib/doe/analysis/analysis.ts';
import { analyze } from '../../../src/lib/doe/analysis/analyze.ts';
import { PLANS } from './plans.ts';
import type { RandomSource } from './simulation.ts';

/** *likely* about a null effect, each term in turn, when rejects out of a lot are counted. */
export function falseLikelyOfRejects(question: {
  lot: number;
  rate: number;
  /** Correlation between parts of one lot. */
  correlation: number;
  planName: string;
  experiments: number;
  random: RandomSource;
}): number {
  const { lot, rate, correlation, planName, experiments, random } = question;
  const plan = PLANS.find(({ name }) => name === planName);
  if (plan === undefined) throw new RangeError(`falseLikelyOfRejects: no plan ${planName}`);
  const factors = [...'ABCDEFG']
    .slice(0, plan.runs[0]?.x.length)
    .map((letter) => ({ letter, kind: 'number' as const }));
  const scale: Scale = 'freeman-tukey';
  let likely = 0;
  for (let experiment = 0; experiment < experiments; experiment++) {
    const runs = plan.runs.map((run) => ({ ...run, n: lot, y: drawRejects(lot, rate, correlation, random) }));
    const { terms } = analyze({ factors, runs, scale });
    likely += terms.filter(({ p }) => (p ?? 1) < 0.05).length / terms.length;
  }
  return likely / experiments;
}

/** Rejects of a lot whose own rate varies by a beta distribution, so that any two of its parts are correlated. */
function drawRejects(lot: number, rate: number, correlation: number, random: RandomSource): number {
  const total = correlation > 0 ? 1 / correlation - 1 : 0;
  const own = total > 0 ? drawBeta(rate * total, (1 - rate) * total, random) : rate;
  let rejects = 0;
  for (let part = 0; part < lot; part++) if (random.uniform() < own) rejects++;
  return rejects;
}

function drawBeta(first: number, second: number, random: RandomSource): number {
  const one = drawGamma(first, random);
  return one / (one + drawGamma(second, random));
}

/** G. Marsaglia & W. W. Tsang, 2000, ACM TOMS 26, 363-372. */
function drawGamma(shape: number, random: RandomSource): number {
  if (shape < 1) return drawGamma(shape + 1, random) * random.uniform() ** (1 / shape);
  const d = shape - 1 / 3;
  const c = 1 / Math.sqrt(9 * d);
  for (;;) {
    const x = random.normal();
    const v = (1 + c * x) ** 3;
    if (v > 0 && Math.log(1 - random.uniform()) < 0.5 * x * x + d - d * v + d * Math.log(v)) return d * v;
  }
}
