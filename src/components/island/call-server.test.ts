import { afterEach, describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { callServer, NoConnection, ServerRefusal } from './call-server.ts';

function answerWith(response: Response | Error) {
  const fetching = vi.fn(async () => {
    if (response instanceof Error) throw response;
    return response;
  });
  vi.stubGlobal('fetch', fetching);
  return fetching;
}

afterEach(() => vi.unstubAllGlobals());

const output = z.object({ id: z.string() });

describe('a call of the server', () => {
  it('sends JSON and gives what the schema names', async () => {
    const fetching = answerWith(Response.json({ id: 'a', secret: 'x' }));
    expect(await callServer('/api/x', { method: 'POST', body: { n: 1 }, output })).toEqual({ id: 'a' });
    expect(fetching).toHaveBeenCalledWith('/api/x', {
      method: 'POST',
      credentials: 'same-origin',
      body: '{"n":1}',
      headers: { 'Content-Type': 'application/json' },
    });
  });

  it('tells a refusal in the server’s words, with or without fields and present state', async () => {
    const problem = { code: 'invalid', status: 422, detail: 'Look again.' };
    answerWith(Response.json(problem, { status: 422 }));
    const thrown = await callServer('/api/x', { output }).catch((error: unknown) => error);
    expect(thrown).toBeInstanceOf(ServerRefusal);
    expect(thrown).toMatchObject({ problem: { ...problem, errors: [] } });
  });

  it.each([
    ['no network', new TypeError('Failed to fetch')],
    ['a page of a proxy', new Response('<h1>Bad gateway</h1>', { status: 502 })],
  ])('takes %s for no connection', async (_, response) => {
    answerWith(response);
    await expect(callServer('/api/x', { output })).rejects.toBeInstanceOf(NoConnection);
  });
});
