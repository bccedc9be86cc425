import type { Analysis, AnalysisInput } from '../analysis/analysis.ts';
import { selectMeasuredRuns } from '../analysis/measured-runs.ts';
import { lettersOf } from '../analysis/terms.ts';
import type { Brief, ResponseSpec } from '../brief.ts';
import { type BeliefMixture, beliefOf } from './belief.ts';
import { type EffectPosterior, inferEffects } from './effect-posterior.ts';
import { type ResponseScale, responseScale } from './response-scale.ts';

/** One result with its readings and the audit's analysis of them. */
export interface ResultInput {
  spec: ResponseSpec;
  input: AnalysisInput;
  analysis: Analysis;
}

/** What is believed about one result at any settings. */
export interface ResultModel {
  spec: ResponseSpec;
  scale: ResponseScale;
  posterior: EffectPosterior;
  /** Expected figure on the scale of the analysis, up to a constant: for comparing many settings. */
  expected(x: readonly number[]): number;
  level(x: readonly number[]): BeliefMixture;
  /** Change from one setting to another, on the scale of the analysis. */
  change(from: readonly number[], to: readonly number[]): BeliefMixture;
  /** Probability that the result's limits hold there; null: it has none. */
  limitsHold(x: readonly number[]): number | null;
  /** Noise of one single part instead of a run's mean, in units of the noise variance. */
  partNoise: number;
  /** Whether the readings show how single parts differ. */
  knowsParts: boolean;
}

/** The model that picks settings: shrunken effects, so that luck in the readings is not mistaken for gain. */
export function modelResult(brief: Brief, result: ResultInput): ResultModel {
  const { spec, input, analysis } = result;
  const { runs, layout } = selectMeasuredRuns(input);
  const { letters } = layout;
  const posterior = inferEffects({
    layout,
    y: runs.map((run) => run.y),
    noise: expectedNoise(brief, spec, analysis),
  });
  const numbers = input.factors.flatMap((factor, index) => (factor.kind === 'number' ? [index] : []));
  // Hundreds of settings are compared, so the letters of each term are looked up once.
  const places = layout.remember('places of terms', () =>
    posterior.terms.map((term) =>
      term === 'bend' ? null : lettersOf(term).map((letter) => letters.indexOf(letter)),
    ),
  );
  const valueAt = (factors: readonly number[] | null, x: readonly number[]) => {
    if (factors === null) return offCorners(x, numbers);
    let product = 1;
    for (const factor of factors) product *= x[factor] ?? 0;
    return product;
  };
  const values = (x: readonly number[]) => places.map((factors) => valueAt(factors, x));
  const scale = responseScale(analysis.scale);
  const partNoise = noiseOfPart(analysis, posterior.noiseVariance);
  return {
    spec,
    scale,
    posterior,
    partNoise,
    knowsParts: analysis.within !== undefined,
    expected(x) {
      let sum = 0;
      for (let term = 0; term < places.length; term++)
        sum += (posterior.means[term] ?? 0) * valueAt(places[term] ?? null, x);
      return sum;
    },
    level: (x) => posterior.level(values(x)),
    change(from, to) {
      const start = values(from);
      return posterior.difference(values(to).map((value, index) => value - (start[index] ?? 0)));
    },
    limitsHold(x) {
      if (spec.lower === undefined && spec.upper === undefined) return null;
      const belief = beliefOf(posterior.level(values(x)), spec.limitFor === 'part' ? partNoise : 0);
      const aboveUpper = spec.upper === undefined ? 0 : belief.above(scale.fromUnit(spec.upper));
      const aboveLower = spec.lower === undefined ? 1 : belief.above(scale.fromUnit(spec.lower));
      return Math.max(0, aboveLower - aboveUpper);
    },
  };
}

/** How far a point is from the corners, 0 there and 1 in the middle: the share of the bend that counts there, the settings taken alike. */
function offCorners(x: readonly number[], numbers: readonly number[]): number {
  if (numbers.length === 0) return 0;
  return numbers.reduce((sum, index) => sum + 1 - (x[index] ?? 0) ** 2, 0) / numbers.length;
}

function noiseOfPart(analysis: Analysis, noiseVariance: number): number {
  const { within } = analysis;
  if (within === undefined || !(noiseVariance > 0)) return 1;
  return 1 + (within.sd ** 2 * (1 - 1 / within.parts)) / noiseVariance;
}

/** What the crew said about the noise of the main result, as a run's figure; only for measured results as they are. */
export function expectedNoise(
  brief: Brief,
  spec: ResponseSpec,
  analysis: Analysis,
): { sd: number; df: number } | undefined {
  const { noise } = brief;
  if (noise === null || spec !== brief.response || analysis.scale !== 'raw' || !(noise.sd > 0))
    return undefined;
  const setup = noise.setup ?? noise.sd / 2;
  const parts = spec.partsPerRun ?? 1;
  const sd = noise.of === 'runMean' ? noise.sd : Math.sqrt(setup ** 2 + noise.sd ** 2 / parts);
  return { sd, df: noise.df ?? 4 };
}
