import { z } from 'zod';
import { callServer, NoConnection } from '../../components/island/call-server.ts';
import { type Board, boardSchema, type RunStory, runStorySchema } from './board.schema.ts';
import { type ReadingsPreview, readingsPreviewSchema } from './readings-file.schema.ts';
import { type RunAnswer, type RunEventInput, runAnswerSchema } from './run-event.schema.ts';
import type { RunTrialEventInput } from './trial-run-event.schema.ts';

/** A board that does not answer for so long counts as not there: the next try may find the line again. */
const patience = 10_000;

/**
 * The board as it is now; what is known already where nothing on it changed.
 * @throws NoConnection, also while somebody else must sign in again
 */
export async function pollBoard(known: Board): Promise<Board> {
  let response: Response;
  try {
    response = await fetch(`/api/trials/${known.trialId}/board`, {
      credentials: 'same-origin',
      headers: { 'If-None-Match': `"${known.stamp}"` },
      cache: 'no-store',
      signal: AbortSignal.timeout(patience),
    });
  } catch (cause) {
    throw new NoConnection({ cause });
  }
  if (response.status === 304) return known;
  if (!response.ok) throw new NoConnection();
  const parsed = boardSchema.safeParse(await response.json().catch(() => null));
  if (!parsed.success) throw new NoConnection();
  return parsed.data;
}

export function runEventCall(runId: string, body: RunEventInput): Promise<RunAnswer> {
  return callServer(`/api/runs/${runId}/events`, { method: 'POST', body, output: runAnswerSchema });
}

/** What happens to the whole trial; the board is asked for afterwards. */
export async function boardEventCall(trialId: string, body: RunTrialEventInput): Promise<void> {
  await callServer(`/api/trials/${trialId}/events`, { method: 'POST', body, output: z.unknown() });
}

export function runStoryCall(runId: string): Promise<RunStory> {
  return callServer(`/api/runs/${runId}`, { output: runStorySchema });
}

export async function removePhotoCall(id: string): Promise<void> {
  await callServer(`/api/photos/${id}`, { method: 'DELETE', output: z.undefined() });
}

/** The number of somebody who was told of a stop. Each look is on record. */
export function phoneCall(trialId: string, personId: string): Promise<{ phone: string }> {
  return callServer(`/api/trials/${trialId}/phone`, {
    method: 'POST',
    body: { personId },
    output: z.object({ phone: z.string() }),
  });
}

/** Readings as a file: looked at, or, with the digest of what was looked at, kept. */
export function readingsFileCall(trialId: string, file: Blob, digest?: string): Promise<ReadingsPreview> {
  const query = digest === undefined ? 'preview=1' : `digest=${digest}`;
  return callServer(`/api/trials/${trialId}/readings/import?${query}`, {
    method: 'POST',
    body: file,
    output: readingsPreviewSchema,
  });
}
