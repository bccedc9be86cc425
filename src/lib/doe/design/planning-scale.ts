import type { Brief, ResponseSpec } from '../brief.ts';
import { chiSquareQuantile } from '../distributions/chi-square.ts';

/** The main result on the scale on which its noise does not depend on its level, with what is known of that noise before any run. */
export interface PlanningScale {
  /** 'noise sd': the noise is unknown, and all sizes are in run-to-run standard deviations. */
  unit: 'response' | 'noise sd';
  /** Standard deviation of one run's figure. */
  runSd: number;
  /** What setting a hard dial afresh adds to all runs of a whole plot. */
  plotSd: number;
  /** Factors by which `runSd` may be too big or too small, 80 % interval. */
  sdRange: [number, number];
  /** W on this scale; null when it cannot be told. */
  worthHaving: number | null;
  /** A size on this scale as a change of the result. */
  toResponse: (size: number) => number;
  /** Set-up spread that nobody gave and that is assumed; in the result's unit. */
  assumedSetup: number | null;
}

const defaultDf = 4;
/** Of the spread of parts: what setting the dials afresh is taken to add where nobody says. */
export const assumedSetupShare = 0.5;

/** Measured results as they are; rejects by twice the arcsine of the root of their share; flaws by twice the root of their count. */
export function choosePlanningScale(brief: Brief): PlanningScale {
  return brief.response.kind === 'measured' ? planMeasured(brief) : planCounted(brief, brief.response);
}

function planMeasured(brief: Brief): PlanningScale {
  const { response, noise } = brief;
  const parts = response.partsPerRun ?? 1;
  const identity = (size: number) => size;
  if (noise === null) {
    const runSd = Math.sqrt(assumedSetupShare ** 2 + 1 / parts);
    return { ...unknownNoise, plotSd: assumedSetupShare / runSd };
  }
  const setup = noise.setup ?? assumedSetupShare * noise.sd;
  return {
    unit: 'response',
    runSd: noise.of === 'part' ? Math.sqrt(setup ** 2 + noise.sd ** 2 / parts) : noise.sd,
    plotSd: setup,
    sdRange: rangeOfSd(noise.df ?? defaultDf),
    worthHaving: response.worthHaving ?? null,
    toResponse: identity,
    assumedSetup: noise.setup === undefined && noise.of === 'part' ? setup : null,
  };
}

/** Pure counting noise is the floor; what the crew saw on normal days counts if it is more. */
function planCounted(brief: Brief, response: ResponseSpec): PlanningScale {
  const usual = response.usualRate;
  const scale = countScale(response);
  if (usual === undefined || response.worthHaving === undefined) return unknownNoise;
  const seen = brief.noise === null ? 0 : brief.noise.sd * scale.slopeAt(usual);
  const runSd = Math.max(scale.floor, seen);
  const here = scale.transform(usual);
  const move = (change: number) => Math.abs(scale.transform(scale.clamp(usual + change)) - here);
  const down = move(-response.worthHaving);
  const up = move(response.worthHaving);
  const worthHaving = response.goal === 'less' ? down : response.goal === 'more' ? up : Math.min(down, up);
  return {
    unit: 'response',
    runSd,
    plotSd: assumedSetupShare * runSd,
    sdRange: seen > scale.floor ? rangeOfSd(brief.noise?.df ?? defaultDf) : [1, 1],
    worthHaving,
    toResponse: (size) => {
      const reachesDown = here - size >= scale.transform(scale.clamp(0));
      const there = response.goal === 'less' && reachesDown ? here - size : here + size;
      return Math.abs(scale.back(there) - usual);
    },
    assumedSetup: null,
  };
}

const unknownNoise: PlanningScale = {
  unit: 'noise sd',
  runSd: 1,
  plotSd: assumedSetupShare,
  sdRange: [1, 1],
  worthHaving: null,
  toResponse: (size) => size,
  assumedSetup: null,
};

interface CountScale {
  transform: (rate: number) => number;
  back: (value: number) => number;
  slopeAt: (rate: number) => number;
  clamp: (rate: number) => number;
  /** Standard deviation of pure counting. */
  floor: number;
}

/** M.F. Freeman & J.W. Tukey (1950), Annals of Mathematical Statistics 21, 607-611. */
function countScale(response: ResponseSpec): CountScale {
  if (response.kind === 'rejects') {
    return {
      transform: (rate) => 2 * Math.asin(Math.sqrt(rate)),
      back: (value) => Math.sin(Math.min(value, Math.PI) / 2) ** 2,
      slopeAt: (rate) => 1 / Math.sqrt(Math.max(rate * (1 - rate), 1e-12)),
      clamp: (rate) => Math.min(1, Math.max(0, rate)),
      floor: 1 / Math.sqrt((response.lotSize ?? 1) + 0.5),
    };
  }
  return {
    transform: (rate) => 2 * Math.sqrt(rate),
    back: (value) => (value / 2) ** 2,
    slopeAt: (rate) => 1 / Math.sqrt(Math.max(rate, 1e-12)),
    clamp: (rate) => Math.max(0, rate),
    floor: 1,
  };
}

const knownRanges = new Map<number, [number, number]>();

function rangeOfSd(df: number): [number, number] {
  const known = knownRanges.get(df) ?? [
    Math.sqrt(df / chiSquareQuantile(0.9, df)),
    Math.sqrt(df / chiSquareQuantile(0.1, df)),
  ];
  knownRanges.set(df, known);
  return known;
}
