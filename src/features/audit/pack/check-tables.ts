import {
  type Analysis,
  type Brief,
  encode,
  letterAt,
  listPseudoErrorTails,
  type ResponseSpec,
  usualValues,
} from '../../../lib/doe/index.ts';
import { listProductNumbers, type PackPoint } from './product-numbers.ts';
import type { CsvCell } from './safe-csv.ts';
import type { TrialFile } from './trial-file.schema.ts';

export interface StoredResult {
  spec: ResponseSpec;
  input: { alpha?: number; scale?: string; terms?: string[] };
  analysis: Analysis;
}

/** The stored results of a verdict; they were written by the core, or checked against it when they were brought in. */
export function resultsOf(verdict: TrialFile['verdicts'][number] | undefined): StoredResult[] {
  return (verdict?.analysis.results ?? []) as unknown as StoredResult[];
}

function listSettings({ factors }: Brief): CsvCell[][] {
  return [
    ['letter', 'name', 'panel_name', 'kind', 'unit', 'low', 'high', 'usual'],
    ...factors.map((factor, place): CsvCell[] => [
      letterAt(place),
      factor.name,
      factor.panelName ?? null,
      factor.kind,
      factor.kind === 'number' ? factor.unit : null,
      factor.low,
      factor.high,
      factor.kind === 'number' ? factor.usual : factor[factor.usual],
    ]),
  ];
}

function listResults(results: readonly StoredResult[]): CsvCell[][] {
  const rungOf = ({ errorPlan }: Analysis, name: string) =>
    errorPlan.strata?.find((stratum) => stratum.name === name)?.rung ?? null;
  return [
    [
      'result',
      'name',
      'unit',
      'kind',
      'lot_size',
      'scale',
      'alpha',
      'terms',
      'rung',
      'rung_whole',
      'rung_sub',
      'regular',
    ],
    ...results.map(({ spec, input, analysis }, result): CsvCell[] => [
      result,
      spec.name,
      spec.unit,
      spec.kind,
      spec.lotSize ?? null,
      analysis.scale,
      analysis.basis.alpha,
      (input.terms ?? analysis.terms.map(({ term }) => term)).join(' '),
      analysis.errorPlan.rung,
      rungOf(analysis, 'whole'),
      rungOf(analysis, 'sub'),
      analysis.lenth !== undefined,
    ]),
  ];
}

const fewestAndMostContrasts = [7, 15] as const;

/** The limit tables for pseudo error that may be asked for: runs that were lost leave fewer contrasts than were planned. */
function listLimits(results: readonly StoredResult[]): CsvCell[][] {
  const plans = results.flatMap(({ analysis }) => [analysis.errorPlan, ...(analysis.errorPlan.strata ?? [])]);
  const used = plans.filter(({ rung }) => rung.startsWith('pseudo')).map(({ replicateDf }) => replicateDf);
  const [fewest, most] = fewestAndMostContrasts;
  const counts = Array.from({ length: most - fewest + 1 }, (_, index) => fewest + index);
  const rows = [...new Set(used)].flatMap((replicateDf) =>
    counts.flatMap((contrasts): CsvCell[][] => {
      const found = listPseudoErrorTails({ contrasts, replicateDf });
      return Object.entries(found?.tails ?? {}).flatMap(([statistic, tail]) =>
        tail.map((log) => [contrasts, replicateDf, statistic, found?.start ?? 0, found?.step ?? 0, log]),
      );
    }),
  );
  return [['contrasts', 'replicate_df', 'statistic', 'grid_start', 'grid_step', 'log_tail'], ...rows];
}

/** Where predictions are compared: the settings to try, the usual ones, the middle, and one corner. */
function listPoints(brief: Brief, best: readonly number[] | undefined): PackPoint[] {
  const usual = usualValues(brief);
  return [
    ...(best ? [{ name: 'best', coded: best }] : []),
    { name: 'usual', coded: brief.factors.map((factor, place) => encode(factor, usual[place] ?? 0)) },
    { name: 'middle', coded: brief.factors.map(() => 0) },
    { name: 'low', coded: brief.factors.map(() => -1) },
  ];
}

/** The small tables that `recompute.R` reads beside the readings; null before a plan was chosen. */
export function listCheckTables(file: TrialFile): Record<string, CsvCell[][]> | null {
  const brief = file.plans.filter(({ phase }) => phase === 'main').at(-1)?.brief;
  if (!brief) return null;
  const verdict = file.verdicts.at(-1);
  const results = resultsOf(verdict);
  const points = listPoints(brief, verdict?.facts.bet.coded);
  const runNumbers = verdict?.facts.runs.map(({ number }) => number) ?? [];
  return {
    'settings.csv': listSettings(brief),
    'results.csv': listResults(results),
    'limits.csv': listLimits(results),
    'points.csv': [
      ['point', ...brief.factors.map((_, place) => letterAt(place))],
      ...points.map(({ name, coded }) => [name, ...coded]),
    ],
    'product.csv': [
      ['result', 'part', 'item', 'statistic', 'value'],
      ...results.flatMap(({ analysis }, result) =>
        listProductNumbers(analysis, { runNumbers, points }).map((row): CsvCell[] => [result, ...row]),
      ),
    ],
  };
}
