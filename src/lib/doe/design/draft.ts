import type {
  BlockSpec,
  Brief,
  Budget,
  ForbiddenRule,
  NoiseGuess,
  NumberFactor,
  ResponseSpec,
} from '../brief.ts';

/** Answers as they stand in a form: any of them may be missing, empty or not yet a number. */
type Sketch<Whole> = { [Key in keyof Whole]?: Whole[Key] | null | undefined };

export type DraftFactor = Sketch<Omit<NumberFactor, 'kind' | 'low' | 'high' | 'usual'>> & {
  kind?: 'number' | 'choice' | null | undefined;
  low?: number | string | null | undefined;
  high?: number | string | null | undefined;
  usual?: number | string | null | undefined;
};

export interface CoachDraft {
  response?: Sketch<ResponseSpec> | null | undefined;
  watch?: readonly Sketch<ResponseSpec>[] | null | undefined;
  factors?: readonly DraftFactor[] | null | undefined;
  forbidden?: readonly ForbiddenRule[] | null | undefined;
  blocks?: BlockSpec | null | undefined;
  budget?: Sketch<Budget> | null | undefined;
  noise?: Sketch<NoiseGuess> | null | undefined;
}

/** The most runs that any plan takes; a budget that says nothing yet forbids nothing. */
const roomForAll = 44;
const mostSettings = 7;

/** No gauge, dial or purse shows numbers beyond these, and sums with them would overflow. */
const [smallest, largest] = [1e-12, 1e12];

/** A number that can be counted with; undefined for whatever else stands in its place. */
export function readNumber(value: unknown): number | undefined {
  if (typeof value !== 'number') return undefined;
  const size = Math.abs(value);
  return size === 0 || (size >= smallest && size <= largest) ? value : undefined;
}

export function readPositive(value: unknown): number | undefined {
  const number = readNumber(value);
  return number !== undefined && number > 0 ? number : undefined;
}

/**
 * The draft as a brief that can be planned for, with a stand-in for each setting, since ranges do not matter to what a plan can see; null where the
 * noise or W of the main result is not known. The brief may still be one that no plan fits.
 */
export function completeDraft({
  response,
  factors,
  forbidden,
  blocks,
  budget,
  noise,
}: CoachDraft): Brief | null {
  const worthHaving = readPositive(response?.worthHaving);
  const usualRate = readNumber(response?.usualRate);
  const kind = response?.kind ?? 'measured';
  const sd = readPositive(noise?.sd);
  if (worthHaving === undefined || (kind === 'measured' ? sd === undefined : usualRate === undefined))
    return null;
  const settings: readonly DraftFactor[] = factors && factors.length > 0 ? factors : [{}];
  return {
    response: {
      name: 'result',
      unit: '',
      kind,
      // Whether a target is reached needs its value; what can be seen near it does not.
      goal: response?.goal ?? 'more',
      target: readNumber(response?.target) ?? 0,
      worthHaving,
      ...keepNumbers({ usualRate, lotSize: response?.lotSize, partsPerRun: response?.partsPerRun }),
    },
    watch: [],
    factors: settings.slice(0, mostSettings).map(standInFor),
    forbidden: [...(forbidden ?? [])],
    ...(blocks ? { blocks } : {}),
    budget: completeBudget(budget ?? {}),
    noise:
      sd === undefined
        ? null
        : { sd, of: noise?.of ?? 'runMean', ...keepNumbers({ df: noise?.df, setup: noise?.setup }) },
  };
}

function standInFor(factor: DraftFactor, index: number): Brief['factors'][number] {
  const manners = {
    name: `setting ${index + 1}`,
    hardToChange: factor.hardToChange === true,
    ...keepNumbers({ settleMinutes: factor.settleMinutes, discardParts: factor.discardParts }),
  };
  if (factor.kind === 'choice')
    return {
      ...manners,
      kind: 'choice',
      low: 'low',
      high: 'high',
      usual: factor.usual === 'high' ? 'high' : 'low',
    };
  return { ...manners, kind: 'number', unit: '', low: -1, high: 1, usual: 0 };
}

/** A limit on time or money counts only beside what one run takes of it. */
function completeBudget(budget: NonNullable<CoachDraft['budget']>): Budget {
  const { maxRuns, minutes, money, minutesPerRun, costPerRun } = keepNumbers({ ...budget });
  return {
    maxRuns: maxRuns ?? roomForAll,
    ...keepNumbers({ minutesPerRun, costPerRun }),
    ...(minutesPerRun === undefined ? {} : keepNumbers({ minutes })),
    ...(costPerRun === undefined ? {} : keepNumbers({ money })),
  };
}

function keepNumbers<Key extends string>(values: { [Name in Key]?: unknown }): { [Name in Key]?: number } {
  const kept: { [Name in Key]?: number } = {};
  for (const key of Object.keys(values) as Key[]) {
    const number = readNumber(values[key]);
    if (number !== undefined) kept[key] = number;
  }
  return kept;
}
