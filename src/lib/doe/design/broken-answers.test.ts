import { describe, expect, test } from 'vitest';
import { anyBrief } from '../../../../tests/builders/brief.ts';
import { fc } from '../../../../tests/setup/seeded-properties.ts';
import type { Brief } from '../brief.ts';
import { PlanError, planRefusalSchema } from './plan-error.ts';
import { proposePlans } from './propose-plans.ts';

describe('whatever single answer is broken', () => {
  const broken = fc.constantFrom<unknown>(
    ...[Number.NaN, Number.POSITIVE_INFINITY, -1, 0, 1e9, 0.5, '', ' ', null, true, 'first', [], {}],
  );

  test('there is a plan, or a PlanError that names the field or a limit', () => {
    let refused = 0;
    fc.assert(
      fc.property(anyBrief({ rules: 1 }), fc.nat(), broken, (sound, place, value) => {
        const paths = listPaths(sound);
        const path = paths[place % paths.length] ?? [];
        const refusal = refusalOf(replaceAt(sound, path, value) as Brief);
        if (refusal === undefined) return;
        refused++;
        expect(planRefusalSchema.safeParse({ ...refusal }).success).toBe(true);
        expect(refusal.field).toMatch(/^(response|watch|factors|forbidden|blocks|budget|noise)\b/);
        expect(Number.isFinite(refusal.need ?? 0)).toBe(true);
      }),
      { numRuns: 250 },
    );
    expect(refused).toBeGreaterThan(100);
  });
});

/** The path of each answer in a brief. */
function listPaths(value: unknown): string[][] {
  if (typeof value !== 'object' || value === null) return [[]];
  return Object.entries(value).flatMap(([key, inner]) => listPaths(inner).map((path) => [key, ...path]));
}

function replaceAt(whole: unknown, [key, ...rest]: readonly string[], value: unknown): unknown {
  if (key === undefined || typeof whole !== 'object' || whole === null) return value;
  const copy: Record<string, unknown> | unknown[] = Array.isArray(whole) ? [...whole] : { ...whole };
  const inner = (whole as Record<string, unknown>)[key];
  Object.assign(copy, { [key]: replaceAt(inner, rest, value) });
  return copy;
}

function refusalOf(brief: Brief): PlanError | undefined {
  try {
    proposePlans(brief);
  } catch (error) {
    if (error instanceof PlanError) return error;
    throw error;
  }
  return undefined;
}
