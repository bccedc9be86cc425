import type { Brief, ChoiceFactor, ForbiddenRule, NumberFactor } from '../../src/lib/doe/brief.ts';
import { fc } from '../setup/seeded-properties.ts';

export function numberFactor(name: string, more: Partial<NumberFactor> = {}): NumberFactor {
  return { kind: 'number', name, unit: 'C', low: 140, high: 160, usual: 150, ...more };
}

export function choiceFactor(name: string, more: Partial<ChoiceFactor> = {}): ChoiceFactor {
  return { kind: 'choice', name, low: 'first', high: 'second', usual: 'low', ...more };
}

/** A sound brief: seal strength, W = 3 N, noise 1.5 N, as many number settings as asked for and room for 20 runs. */
export function buildBrief(settings: number, more: Partial<Brief> = {}): Brief {
  return {
    response: { name: 'seal strength', unit: 'N', kind: 'measured', goal: 'more', worthHaving: 3 },
    watch: [],
    factors: Array.from({ length: settings }, (_, index) => numberFactor(`setting ${index + 1}`)),
    forbidden: [],
    budget: { maxRuns: 20 },
    noise: { sd: 1.5, of: 'runMean' },
    ...more,
  };
}

const level = fc.constantFrom<-1 | 1>(-1, 1);

/** Rules on two to four settings each. */
export function anyRules(settings: number, most: number): fc.Arbitrary<ForbiddenRule[]> {
  const letters = 'ABCDEFG'.slice(0, settings).split('');
  const rule = fc
    .tuple(
      fc.subarray(letters, { minLength: Math.min(2, settings), maxLength: Math.min(4, settings) }),
      fc.array(level, { minLength: 4, maxLength: 4 }),
    )
    .map(([named, levels]) => Object.fromEntries(named.map((letter, index) => [letter, levels[index] ?? 1])));
  return fc.array(rule, { maxLength: most });
}

/** Sound briefs of every make: settings, choices, hard ones, blocks, limits, noise, parts. */
export function anyBrief(options: { rules: number }): fc.Arbitrary<Brief> {
  return fc.integer({ min: 1, max: 7 }).chain((settings) =>
    fc
      .record({
        kinds: fc.array(fc.constantFrom('number', 'number', 'choice'), {
          minLength: settings,
          maxLength: settings,
        }),
        hard: fc.subarray(
          Array.from({ length: settings }, (_, index) => index),
          { maxLength: Math.min(2, settings) },
        ),
        areHard: fc.boolean(),
        usual: fc.constantFrom<'low' | 'high'>('low', 'high'),
        rules:
          options.rules > 0 && settings > 1
            ? anyRules(settings, options.rules)
            : fc.constant<ForbiddenRule[]>([]),
        blocks: fc.constantFrom(1, 1, 2, 4),
        maxRuns: fc.integer({ min: 8, max: 44 }),
        minutes: fc.option(fc.integer({ min: 100, max: 600 }), { nil: null }),
        sd: fc.option(fc.double({ min: 0.2, max: 6, noNaN: true }), { nil: null }),
        parts: fc.integer({ min: 1, max: 6 }),
      })
      .map(({ kinds, hard, areHard, usual, rules, blocks, maxRuns, minutes, sd, parts }) =>
        buildBrief(settings, {
          factors: kinds.map((kind, index) => {
            const manners = {
              hardToChange: areHard && hard.includes(index),
              settleMinutes: 3 * index,
              discardParts: index,
            };
            const name = `setting ${index}`;
            return kind === 'choice'
              ? choiceFactor(name, { ...manners, usual })
              : numberFactor(name, { ...manners, step: 3 });
          }),
          response: {
            name: 'strength',
            unit: 'N',
            kind: 'measured',
            goal: 'more',
            worthHaving: 3,
            partsPerRun: parts,
          },
          forbidden: rules,
          ...(blocks > 1
            ? { blocks: { name: 'batch', kind: 'batch' as const, count: blocks, runsEach: 8 } }
            : {}),
          budget: { maxRuns, minutesPerRun: 10, costPerRun: 4, ...(minutes === null ? {} : { minutes }) },
          noise: sd === null ? null : { sd, of: 'part' },
        }),
      ),
  );
}
