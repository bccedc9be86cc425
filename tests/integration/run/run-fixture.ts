import type { Board, BoardRun } from '../../../src/features/run/board.schema.ts';
import { readBoard } from '../../../src/features/run/read-board.service.ts';
import type { RunEventInput } from '../../../src/features/run/run-event.schema.ts';
import { runEventSchema } from '../../../src/features/run/run-event.schema.ts';
import { carryOutRunEvent } from '../../../src/features/run/run-event.service.ts';
import type { Answers } from '../../../src/features/trial/answers.schema.ts';
import { trialEventSchema } from '../../../src/features/trial/trial.schema.ts';
import { carryOutEvent } from '../../../src/features/trial/trial-event.service.ts';
import type { TrialReader } from '../../../src/features/trial/trial-reader.service.ts';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { newId } from '../../../src/server/ids.ts';
import { buildRunningTrial } from '../../builders/measured-trial.ts';
import { buildTrialShop, type TrialShop } from '../trial/trial-fixture.ts';

/** Two parts a run, burnt edges out of 50 watched, six runs or so: quick to play through. */
export const shortAnswers: Answers = {
  measuring: { who: 'operator', when: 'atOnce', partsPerRun: '2' },
  watch: { results: [{ id: 'burnt', name: 'burnt edges', wish: 'less', kind: 'rejects', lotSize: '50' }] },
  neverRun: { mixes: [] },
};

export interface BoardScene {
  shop: TrialShop;
  trialId: string;
  board(reader?: TrialReader): Promise<Board>;
  run(number: number): Promise<BoardRun>;
  /** What somebody does to a run, as the board sends it; with its present revision unless told. */
  doRun(number: number, event: Record<string, unknown>, reader?: TrialReader): Promise<unknown>;
  doTrial(event: Record<string, unknown>, reader?: TrialReader): Promise<void>;
}

/** A running trial on which Ana has every run. */
export async function buildBoard(overrides: Record<string, unknown> = {}): Promise<BoardScene> {
  const shop = await buildTrialShop(overrides);
  const crew = { shifts: [{ id: 'day', name: 'Day', runs: shop.anaId }] };
  const trialId = await buildRunningTrial(shop.scope, {
    ownerId: shop.dana.personId,
    personId: shop.anaId,
    answers: { ...shortAnswers, crew },
  });
  const board = (reader = shop.dana) => readBoard(shop.as(reader), trialId, reader);
  const run = async (number: number) => {
    const found = (await board()).runs.find((each) => each.number === number);
    if (!found) throw new Error(`no run ${number}`);
    return found;
  };
  return {
    shop,
    trialId,
    board,
    run,
    async doRun(number, event, reader = shop.dana) {
      const { id, revision } = await run(number);
      const seen = event['event'] === 'note' ? {} : { revision };
      const body = runEventSchema.parse({ submission: newId(), ...seen, ...event } as RunEventInput);
      return carryOutRunEvent(shop.as(reader), { runId: id, body }, reader);
    },
    async doTrial(event, reader = shop.dana) {
      const { revision } = await board();
      const needs = ['pause', 'resume', 'judge'].includes(String(event['event']));
      const body = trialEventSchema.parse({ ...(needs ? { revision } : {}), ...event });
      await carryOutEvent(shop.as(reader), { trialId, body }, reader);
    },
  };
}

/** Both parts and the count of one run. */
export function allFigures(value: number, rejects = 1) {
  return [
    { result: 0, part: 1, value },
    { result: 0, part: 2, value: value + 0.4 },
    { result: 1, part: 1, rejects },
  ];
}

/** Gives every run that is open its figures. */
export async function recordAll(scene: BoardScene): Promise<void> {
  for (const { number, state } of (await scene.board()).runs) {
    if (state === 'done' || state === 'skipped') continue;
    await scene.doRun(number, { event: 'record', figures: allFigures(36 + number / 10) });
  }
}

/** The trial's last lines in the log, newest first. */
export async function kindsOf({ shop, trialId }: BoardScene, limit = 5): Promise<string[]> {
  return (await listActivity(shop.scope, { limit, trialId })).map(({ kind }) => kind);
}
