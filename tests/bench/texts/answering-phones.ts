import { setTimeout as wait } from 'node:timers/promises';
import type { KeptText } from '../../../src/fakes/text-service/kept-texts.ts';
import type { StandIns } from '../../integration/stand-ins.ts';
import { type CrowdMember, runsATrial } from './crowd.ts';

/** Phones that answer each run they are sent, once, with a figure of its own. */
export interface AnsweringPhones {
  /** What was answered, by `<phone> <run>`. */
  readonly answered: ReadonlyMap<string, number>;
  /** The runs that reached each phone, as often as the service handed them over: `<phone> <run>`. */
  readonly prompts: ReadonlyMap<string, number>;
  /** Texts both ways so far. */
  passed(): number;
  stop(): Promise<void>;
}

const lookMilliseconds = 40;
const prompt = new RegExp(`run (\\d+) of ${runsATrial}\\b`);

/** Within what the crew usually reads, and no two alike: a figure that lands on another run is seen. */
export function figureOf(place: number, run: number): number {
  return Math.round((32 + (place * runsATrial + run) * 0.011) * 1000) / 1000;
}

export function startPhones(standIns: StandIns, crowd: readonly CrowdMember[]): AnsweringPhones {
  const placeOf = new Map(crowd.map(({ phone }, place) => [phone, place]));
  const answered = new Map<string, number>();

  const prompts = new Map<string, number>();
  let passed = 0;

  const answer = async ({ to, from, body }: KeptText): Promise<void> => {
    const run = Number(prompt.exec(body)?.[1] ?? 0);
    const place = placeOf.get(to);
    if (run === 0 || place === undefined) return;
    const key = `${to} ${run}`;
    prompts.set(key, (prompts.get(key) ?? 0) + 1);
    if (answered.has(key)) return;
    const figure = figureOf(place, run);
    answered.set(key, figure);
    // Half of them name the run, half send the bare number.
    const words = run % 2 === 0 ? `run ${run}: ${figure}` : String(figure);
    await standIns.textFromPhone({ from: to, to: from, body: words });
  };

  let isOver = false;
  const look = async (): Promise<void> => {
    while (!isOver) {
      const texts = await standIns.texts(passed);
      passed += texts.length;
      for (const text of texts) if (text.direction === 'outbound-api') await answer(text);
      if (texts.length === 0) await wait(lookMilliseconds);
    }
  };
  const looking = look();

  return {
    answered,
    prompts,
    passed: () => passed,
    stop: () => {
      isOver = true;
      return looking;
    },
  };
}
