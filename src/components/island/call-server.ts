import { z } from 'zod';

const problemSchema = z.object({
  code: z.string(),
  status: z.number(),
  detail: z.string().default(''),
  errors: z.array(z.object({ pointer: z.string(), code: z.string(), detail: z.string() })).default([]),
  present: z.unknown().optional(),
});
export type ServerProblem = z.output<typeof problemSchema>;

/** The server understood and said no; `problem.detail` is its sentence in the reader's language. */
export class ServerRefusal extends Error {
  constructor(readonly problem: ServerProblem) {
    super(problem.code);
    this.name = 'ServerRefusal';
  }
}

/** Nothing came back: no network, or a server that is being restarted. What was typed is still on the page. */
export class NoConnection extends Error {
  constructor(options?: ErrorOptions) {
    super('no connection', options);
    this.name = 'NoConnection';
  }
}

async function readProblem(response: Response): Promise<ServerProblem> {
  const body: unknown = await response.json().catch(() => null);
  const parsed = problemSchema.safeParse(body);
  // A proxy in between answers with a page of its own.
  if (!parsed.success) throw new NoConnection();
  return parsed.data;
}

/**
 * Calls an endpoint of ours and checks what comes back.
 * @param call.body sent as JSON, save a `Blob`, which is sent as it is
 * @param call.keepalive whether it goes on when the page is left; browsers then carry at most 64 KB
 * @throws ServerRefusal or NoConnection
 */
export async function callServer<Output>(
  path: string,
  call: {
    method?: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';
    body?: unknown;
    output: z.ZodType<Output>;
    keepalive?: boolean;
  },
): Promise<Output> {
  const { method = 'GET', body, output, keepalive = false } = call;
  const isFile = body instanceof Blob;
  let response: Response;
  try {
    response = await fetch(path, {
      method,
      credentials: 'same-origin',
      ...(keepalive ? { keepalive } : {}),
      ...(body === undefined ? {} : { body: isFile ? body : JSON.stringify(body) }),
      ...(body === undefined || isFile ? {} : { headers: { 'Content-Type': 'application/json' } }),
    });
  } catch (cause) {
    throw new NoConnection({ cause });
  }
  if (!response.ok) throw new ServerRefusal(await readProblem(response));
  return output.parse(response.status === 204 ? undefined : await response.json());
}
