import { once } from 'node:events';
import { createServer } from 'node:net';

/** A port that nobody listens on right now. */
export async function findFreePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const address = server.address();
  if (address === null || typeof address === 'string')
    throw new RangeError('findFreePort: no port was given');
  server.close();
  await once(server, 'close');
  return address.port;
}
