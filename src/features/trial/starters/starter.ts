import type { TFunction } from 'i18next';
import type { HazardName, ResultKind, StopRule, wishes } from '../answer-choices.ts';
import type { Answers } from '../answers.schema.ts';

export type StarterWords = TFunction<'starters'>;

interface StarterResult {
  name: string;
  unit?: string;
  wish: (typeof wishes)[number];
  target?: number;
  kind: ResultKind;
  lotSize?: number;
  usual: number;
  atLeast?: number;
  atMost?: number;
}

interface Dial {
  id: string;
  name: string;
  /** Only where the starter is the demo's own machine: elsewhere the panel alone can tell. */
  panelName?: string;
  unit: string;
  low: number;
  high: number;
  usual: number;
  settleMinutes?: number;
  discardParts?: number;
  harderEnd?: 'low' | 'high';
}

/** An A-or-B; the first is the one in use. */
interface Pair {
  id: string;
  name: string;
  panelName?: string;
  either: readonly [string, string];
}

/**
 * A common shop problem with usual settings. Every figure is an example from common practice, to be changed to what
 * the machine at hand does; none of them is advice on what is safe to run.
 */
export interface Starter {
  title: string;
  result: StarterResult & { lowest: number; highest: number; worth: number };
  measuring: NonNullable<Answers['measuring']>;
  settings: readonly (Dial | Pair)[];
  hazards: readonly HazardName[];
  stop: readonly StopRule[];
  watch: StarterResult;
}

/** Figures as people type them in this language, with its decimal mark. */
function typist(decimalMark: string) {
  return (value: number | undefined) =>
    value === undefined ? undefined : String(value).replace('.', decimalMark);
}

function typedResult(result: StarterResult, type: ReturnType<typeof typist>) {
  const { name, unit, wish, target, kind, lotSize } = result;
  return {
    name,
    ...(unit === undefined ? {} : { unit }),
    wish,
    ...(target === undefined ? {} : { target: type(target) }),
    kind,
    ...(lotSize === undefined ? {} : { lotSize: type(lotSize) }),
  };
}

function typedLimits({ atLeast, atMost }: StarterResult, type: ReturnType<typeof typist>) {
  if (atLeast === undefined && atMost === undefined) return { noLimit: true };
  return {
    ...(atLeast === undefined ? {} : { atLeast: type(atLeast) }),
    ...(atMost === undefined ? {} : { atMost: type(atMost) }),
  };
}

function typedSetting(setting: Dial | Pair, type: ReturnType<typeof typist>) {
  const { id, name, panelName } = setting;
  const names = { id, name, ...(panelName === undefined ? {} : { panelName }) };
  if ('either' in setting) {
    const [low, high] = setting.either;
    return { ...names, kind: 'choice' as const, low, high, usual: 'low' as const };
  }
  const { unit, low, high, usual, settleMinutes, discardParts, harderEnd } = setting;
  return {
    ...names,
    kind: 'number' as const,
    unit,
    low: type(low),
    high: type(high),
    usual: type(usual),
    ...(settleMinutes === undefined ? {} : { settleMinutes: type(settleMinutes) }),
    ...(discardParts === undefined ? {} : { discardParts: type(discardParts) }),
    ...(harderEnd === undefined ? {} : { harderEnd }),
  };
}

/**
 * A starter as if somebody had typed it. What protects people is left open: only those who stand at the machine can
 * say which cautions are in place.
 */
export function typeStarter(starter: Starter, decimalMark: string): Answers {
  const type = typist(decimalMark);
  const { title, result, measuring, settings, hazards, stop, watch } = starter;
  return {
    job: { title },
    result: typedResult(result, type),
    measuring,
    usual: { usual: type(result.usual), lowest: type(result.lowest), highest: type(result.highest) },
    worth: { change: type(result.worth) },
    limit: typedLimits(result, type),
    watch: {
      results: [
        {
          id: 'watched',
          ...typedResult(watch, type),
          usual: type(watch.usual),
          ...typedLimits(watch, type),
        },
      ],
    },
    settings: { settings: settings.map((setting) => typedSetting(setting, type)) },
    hazards: { ticked: hazards.map((hazard) => ({ hazard, cautions: [] })) },
    stop: { picked: [...stop] },
    around: {
      batch: { way: 'same' },
      shift: { way: 'same' },
      machine: { way: 'same' },
      gauge: { way: 'same' },
      room: { way: 'writeDown' },
      crew: { way: 'writeDown' },
    },
  };
}
