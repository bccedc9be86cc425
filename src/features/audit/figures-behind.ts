import { type AdviceFact, type Fact, isAdviceFact } from '../../lib/doe/index.ts';
import { type AuditPart, auditAddress } from './frame/audit-parts.ts';

/** A page of the audit and the place on it. */
type Place = readonly [AuditPart, string];

/** Where the figures stand that a statement of the verdict rests on; a kind without a place is a type error. */
const places: Readonly<Record<AdviceFact['kind'], Place>> = {
  matters: ['model', 'terms'],
  'real-but-small': ['model', 'terms'],
  'no-real-difference': ['model', 'terms'],
  'cant-tell': ['model', 'terms'],
  'depends-on-partner': ['model', 'terms'],
  'likeliest-of-tied': ['model', 'aliases'],
  'pair-corners': ['prediction', 'prediction'],
  'would-settle': ['model', 'error'],
  'watched-moves': ['model', 'terms'],
  'steadier-matters': ['data', 'readings'],
  'all-runs-in': ['data', 'settings'],
  'runs-missing': ['data', 'settings'],
  'runs-failed': ['data', 'settings'],
  'failed-together': ['data', 'settings'],
  'noise-found': ['model', 'error'],
  'error-judged-from-small-effects': ['checks', 'half-normal'],
  'error-by-counting-theory': ['model', 'error'],
  'no-error': ['model', 'error'],
  'odd-reading': ['checks', 'residuals'],
  'drift-seen': ['checks', 'drift'],
  'no-drift-seen': ['checks', 'drift'],
  'drift-not-judged': ['checks', 'drift'],
  'no-bend-in-sum': ['model', 'curvature'],
  bends: ['model', 'curvature'],
  'bend-not-settled': ['model', 'curvature'],
  'bend-not-looked-at': ['model', 'curvature'],
  'few-counts': ['data', 'readings'],
  'other-scale-fits-better': ['checks', 'box-cox'],
  'nothing-outside-range': ['plan', 'levels'],
  'cannot-be-told-apart': ['plan', 'design'],
  'hidden-by-batches': ['plan', 'design'],
  'short-term-spread': ['model', 'error'],
  'clear-gain': ['prediction', 'prediction'],
  'likely-gain': ['prediction', 'prediction'],
  'possible-gain': ['prediction', 'prediction'],
  'real-but-too-small': ['model', 'terms'],
  'nothing-makes-a-difference': ['model', 'terms'],
  'nothing-settled': ['model', 'error'],
  'limits-clash': ['prediction', 'prediction'],
  'some-runs-failed': ['data', 'settings'],
  'trial-spoilt': ['data', 'settings'],
  'check-runs': ['prediction', 'prediction'],
  'keep-today': ['model', 'terms'],
  'run-missing-now': ['data', 'settings'],
  'measure-again': ['checks', 'residuals'],
  'narrow-range': ['data', 'settings'],
  untie: ['plan', 'design'],
  'follow-the-curve': ['model', 'curvature'],
  'move-window': ['prediction', 'prediction'],
  'repeat-for-certainty': ['model', 'error'],
  'was-run': ['data', 'settings'],
  'was-not-run': ['data', 'settings'],
  'stays-as-it-is': ['model', 'terms'],
  'only-what-was-run': ['model', 'curvature'],
  'away-from-failures': ['data', 'settings'],
  'nothing-worth-changing': ['prediction', 'prediction'],
  held: ['check-runs', 'gain'],
  'fell-short': ['check-runs', 'gain'],
  'not-sure-yet': ['check-runs', 'gain'],
};

/** What a fact's places of runs are called on the page. */
export type RunNumbers = readonly { readonly number: number }[];

/** The line itself, where the statement is about one term or one run. */
function lineOf(fact: AdviceFact, [part, anchor]: Place, runs: RunNumbers): string {
  const term = fact.refs.terms?.[0];
  if (part === 'model' && anchor === 'terms' && term !== undefined) return `term-${term}`;
  const run = runs[fact.refs.runs?.[0] ?? -1]?.number;
  if (run === undefined) return anchor;
  if (fact.kind === 'odd-reading') return `check-run-${run}`;
  return part === 'data' && anchor === 'settings' ? `run-${run}` : anchor;
}

/** The address of the figures that a statement rests on; null for what is not said after the runs. */
export function figuresBehind(trialId: string, fact: Fact, runs: RunNumbers): string | null {
  if (!isAdviceFact(fact)) return null;
  const place = places[fact.kind];
  const result = fact.refs.results?.[0] ?? 0;
  return auditAddress(trialId, place[0], { result }, lineOf(fact, place, runs));
}
