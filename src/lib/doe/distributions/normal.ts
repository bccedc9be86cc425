/**
 * Rational approximations of the normal distribution function (W. J. Cody, 1969, Mathematics of Computation 23, 631-637; constants as in
 * Cody, 1993, ACM TOMS 19, algorithm 715). Relative error about 1e-15 in both tails.
 */
const centerNumerator = [
  2.2352520354606837, 161.02823106855587, 1067.6894854603709, 18154.98125334356, 0.06568233791820745,
] as const;
const centerDenominator = [
  47.202581904688245, 976.0985517377767, 10260.932208618979, 45507.78933502673,
] as const;
const middleNumerator = [
  0.39894151208813466, 8.883149794388377, 93.50665613217785, 597.2702763948002, 2494.5375852903726,
  6848.190450536283, 11602.65143764735, 9842.714838383978, 1.0765576773720192e-8,
] as const;
const middleDenominator = [
  22.266688044328117, 235.387901782625, 1519.3775994075547, 6485.558298266761, 18615.571640885097,
  34900.95272114598, 38912.00328609327, 19685.429676859992,
] as const;
const farNumerator = [
  0.215898534057957, 0.12740116116024736, 0.022235277870649807, 0.0014216191932278934,
  0.000029112874951168793, 0.023073441764940174,
] as const;
const farDenominator = [
  1.284260096144911, 0.4682382124808651, 0.06598813786892856, 0.0037823963320275824, 0.00007297515550839662,
] as const;
const oneOverRootTwoPi = 0.3989422804014327;
const rootThirtyTwo = 5.656854249492381;

/** Probability that a standard normal variable is below z. */
export function normalCdf(z: number): number {
  return normalUpperTail(-z);
}

/** Probability that a standard normal variable is above z; small tails keep their digits. */
export function normalUpperTail(z: number): number {
  const size = Math.abs(z);
  if (size <= 0.67448975) return 0.5 - z * evaluateCenter(z * z);
  const tail = size < rootThirtyTwo ? evaluateMiddle(size) : evaluateFar(size);
  return z > 0 ? tail : 1 - tail;
}

/** Height of the standard normal density at z. */
export function normalDensity(z: number): number {
  return oneOverRootTwoPi * Math.exp(-0.5 * z * z);
}

function evaluateCenter(square: number): number {
  let numerator = centerNumerator[4] * square;
  let denominator = square;
  for (let i = 0; i < 3; i++) {
    numerator = (numerator + (centerNumerator[i] ?? 0)) * square;
    denominator = (denominator + (centerDenominator[i] ?? 0)) * square;
  }
  return (numerator + centerNumerator[3]) / (denominator + centerDenominator[3]);
}

function evaluateMiddle(size: number): number {
  let numerator = middleNumerator[8] * size;
  let denominator = size;
  for (let i = 0; i < 7; i++) {
    numerator = (numerator + (middleNumerator[i] ?? 0)) * size;
    denominator = (denominator + (middleDenominator[i] ?? 0)) * size;
  }
  return (
    (exponentialOfHalfSquare(size) * (numerator + middleNumerator[7])) / (denominator + middleDenominator[7])
  );
}

function evaluateFar(size: number): number {
  const square = 1 / (size * size);
  let numerator = farNumerator[5] * square;
  let denominator = square;
  for (let i = 0; i < 4; i++) {
    numerator = (numerator + (farNumerator[i] ?? 0)) * square;
    denominator = (denominator + (farDenominator[i] ?? 0)) * square;
  }
  const correction = (square * (numerator + farNumerator[4])) / (denominator + farDenominator[4]);
  return (exponentialOfHalfSquare(size) * (oneOverRootTwoPi - correction)) / size;
}

// exp(-z²/2) with z² split into an exactly squared part and a small rest: squaring first would lose digits for large z.
function exponentialOfHalfSquare(size: number): number {
  const coarse = Math.trunc(size * 16) / 16;
  const rest = (size - coarse) * (size + coarse);
  return Math.exp(-0.5 * coarse * coarse) * Math.exp(-0.5 * rest);
}
