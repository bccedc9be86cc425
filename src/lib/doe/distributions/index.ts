export { chiSquareCdf, chiSquareQuantile, chiSquareUpperTail } from './chi-square.ts';
export { fCdf, fQuantile, fUpperQuantile, fUpperTail } from './f.ts';
export { regularizedIncompleteBeta } from './incomplete-beta.ts';
export { regularizedIncompleteGamma } from './incomplete-gamma.ts';
export { logGamma } from './log-gamma.ts';
export { noncentralTCdf, noncentralTUpperTail } from './noncentral-t.ts';
export { normalCdf, normalDensity, normalUpperTail } from './normal.ts';
export { normalQuantile } from './normal-quantile.ts';
export { noncentralityForPower, powerBeyond, powerOfTwoSidedT } from './power-of-two-sided-t.ts';
export {
  studentTCdf,
  studentTCentral,
  studentTQuantile,
  studentTTwoSided,
  studentTUpperQuantile,
  studentTUpperTail,
} from './student-t.ts';
export {
  studentizedMaximumModulusQuantile,
  studentizedMaximumModulusUpperTail,
} from './studentized-maximum-modulus.ts';
export { trigamma } from './trigamma.ts';
