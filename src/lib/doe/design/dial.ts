import type { Brief, FactorSpec, NumberFactor } from '../brief.ts';
import { isForbidden } from './forbidden.ts';
import { tidyNumber } from './tidy-number.ts';

/** Further from plan than this share of the half range, and a setting is analyzed as reached. */
const asPlanned = 0.05;

/** A point as the dials can be set. */
export interface DialPoint {
  /** Planned coded settings; a middle that the dial's steps do not allow is given as it will be. */
  coded: number[];
  /** Numbers in their unit, choices by name. */
  actual: (number | string)[];
}

/**
 * The nearest point that the dials allow: numbers on their steps, never into what a rule forbids. Low and high are taken as they are.
 */
export function setDials(brief: Brief, x: readonly number[]): DialPoint {
  const between = brief.factors.flatMap((factor, index) =>
    isBetweenSteps(factor, x[index] ?? 0) ? [index] : [],
  );
  for (let ups = 0; ups < 2 ** between.length; ups++) {
    const roundedUp = between.filter((_, place) => (ups >> place) & 1);
    const point = setAll(brief, x, roundedUp);
    if (!isForbidden(brief, point.coded)) return point;
  }
  return setAll(brief, x, []);
}

/** Where the middle runs of a number setting will be: halfway, or at the last step of the dial below that. */
export function middleOnDial(range: Pick<NumberFactor, 'low' | 'high' | 'step'>): number {
  const factor: FactorSpec = { kind: 'number', name: '', unit: '', usual: range.low, ...range };
  return Number(isBetweenSteps(factor, 0) ? roundToStep(factor, 0, false) : decode(factor, 0));
}

/** The value of a coded setting in its unit, or the name of the choice. */
export function decode(factor: FactorSpec, coded: number): number | string {
  if (factor.kind === 'choice') return coded > 0 ? factor.high : factor.low;
  return tidyNumber(factor.low + ((coded + 1) / 2) * (factor.high - factor.low));
}

/** The coded value of an actual setting: -1 at low, +1 at high. */
export function encode(factor: FactorSpec, actual: number | string): number {
  if (factor.kind === 'choice') return actual === factor.high ? 1 : -1;
  return (2 * Number(actual) - factor.low - factor.high) / (factor.high - factor.low);
}

function setAll(brief: Brief, x: readonly number[], roundedUp: readonly number[]): DialPoint {
  const actual = brief.factors.map((factor, index) => {
    const coded = x[index] ?? 0;
    return isBetweenSteps(factor, coded)
      ? roundToStep(factor, coded, roundedUp.includes(index))
      : decode(factor, coded);
  });
  const coded = brief.factors.map((factor, index) => {
    const planned = x[index] ?? 0;
    const reached = encode(factor, actual[index] ?? 0);
    return Math.abs(reached - planned) > asPlanned ? reached : planned;
  });
  return { coded, actual };
}

function isBetweenSteps(factor: FactorSpec, coded: number): boolean {
  if (factor.kind === 'choice' || factor.step === undefined || Math.abs(coded) === 1) return false;
  const steps = Number(decode(factor, coded)) / factor.step;
  return Math.abs(steps - Math.round(steps)) > 1e-9;
}

function roundToStep(factor: FactorSpec, coded: number, up: boolean): number | string {
  if (factor.kind === 'choice' || factor.step === undefined) return decode(factor, coded);
  const steps = Number(decode(factor, coded)) / factor.step;
  return tidyNumber((up ? Math.ceil(steps) : Math.floor(steps)) * factor.step);
}
