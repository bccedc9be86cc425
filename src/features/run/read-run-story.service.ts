import type { ShopScope } from '../../server/db/scope.ts';
import { readNames } from '../people/people.repository.ts';
import type { RunStory, StoryLine } from './board.schema.ts';
import { listNotes } from './note.repository.ts';
import { listReadings } from './readings.repository.ts';
import { findRunOf } from './run-reader.service.ts';
import { listRepliesToRun, listTextsOfRun } from './talk.repository.ts';

/** All that happened to a run: what was texted, what came back, what was typed and noted. @throws AppError `not-found` */
export async function readRunStory(scope: ShopScope, runId: string): Promise<RunStory> {
  const run = await findRunOf(scope, runId);
  const texts = await listTextsOfRun(scope, runId);
  const replies = await listRepliesToRun(scope, runId);
  const notes = (await listNotes(scope, run.trialId)).filter((note) => note.run_id === runId);
  const readings = await listReadings(scope, [runId]);
  const people = [
    ...[...texts, ...replies].map(({ person_id }) => person_id),
    ...notes.map(({ written_by }) => written_by),
    ...readings.map(({ enteredBy }) => enteredBy),
  ];
  const names = await readNames(scope, [...new Set(people.filter((id) => id !== null))]);
  const nameOf = (id: string | null) => (id === null ? '' : (names.get(id) ?? ''));
  const lines: StoryLine[] = [
    ...texts.map(({ person_id, body, state, created_at, sent_at }) => ({
      kind: 'text' as const,
      at: sent_at ?? created_at,
      to: nameOf(person_id),
      body,
      state,
    })),
    ...replies.map(({ person_id, body, sent_at }) => ({
      kind: 'reply' as const,
      at: sent_at,
      by: nameOf(person_id),
      body,
    })),
    ...notes.map(({ written_by, words, created_at }) => ({
      kind: 'note' as const,
      at: created_at,
      by: nameOf(written_by),
      words,
    })),
    ...readings.map(({ enteredBy, createdAt, result, part, value, rejects, lot, state, source, reason }) => ({
      kind: 'reading' as const,
      at: createdAt,
      by: nameOf(enteredBy),
      ...{ result, part, value, rejects, lot, state, source, reason },
    })),
  ];
  return { id: run.id, lines: lines.sort((one, other) => one.at - other.at) };
}
