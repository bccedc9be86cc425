import { readdirSync, readFileSync } from 'node:fs';
import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';

const folder = new URL('../../dist/client/_astro/', import.meta.url);
const files = readdirSync(folder).filter((file) => file.endsWith('.js'));

interface Script {
  bytes: number;
  imports: string[];
}

const scripts = new Map<string, Script>(
  files.map((file) => {
    const text = readFileSync(new URL(file, folder), 'utf8');
    const imports = [...text.matchAll(/(?:from|import)\s*"\.\/([^"]+\.js)"/g)].map(([, name = '']) => name);
    return [file, { bytes: gzipSync(text).length, imports }];
  }),
);

/** Everything a script needs before it can run; what it asks for later, on demand, is not among it. */
function needsOf(file: string, found = new Set<string>()): Set<string> {
  if (found.has(file)) return found;
  found.add(file);
  for (const next of scripts.get(file)?.imports ?? []) needsOf(next, found);
  return found;
}

function scriptOf(island: string): string {
  const file = files.find((name) => name.startsWith(`${island}.`));
  if (file === undefined) throw new RangeError(`scriptOf: no island ${island} in the build`);
  return file;
}

/** Bytes, compressed, that a page with this island asks for, React among them. */
function weigh(island: string): { bytes: number; names: string[] } {
  const all = needsOf(scriptOf(island), needsOf(scriptOf('client')));
  const bytes = [...all].reduce((sum, file) => sum + (scripts.get(file)?.bytes ?? 0), 0);
  return { bytes, names: [...all] };
}

describe('what a page asks of the network', () => {
  it.each([
    'ProblemPage',
    'TodayPage',
    'SettingsPage',
    'SafetyPage',
    'AroundPage',
    'PlanPage',
    'CrewPage',
    'StartPage',
  ])('is at most 170 kB of scripts for the wizard (%s), and no charts', (island) => {
    const { bytes, names } = weigh(island);
    expect(bytes).toBeLessThanOrEqual(170_000);
    expect(names.filter((name) => /nivo|Chart|papaparse/i.test(name))).toEqual([]);
  });

  it('is less for the board, which is open all day', () => {
    expect(weigh('Board').bytes).toBeLessThanOrEqual(150_000);
  });
});
