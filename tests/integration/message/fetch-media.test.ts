import { createServer, type RequestListener, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, describe, expect, it } from 'vitest';
import { fetchMedia, type MediaSettings } from '../../../src/features/message/fetch-media.ts';

const servers: Server[] = [];

async function serve(answer: RequestListener): Promise<string> {
  const server = createServer(answer);
  servers.push(server);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}
afterAll(() => {
  for (const server of servers) server.closeAllConnections();
  for (const server of servers) server.close();
});

const picture = Buffer.alloc(2_000, 7);
const showPicture: RequestListener = (_request, response) =>
  response.writeHead(200, { 'content-type': 'image/jpeg' }).end(picture);

function settingsFor(serviceUrl: string, change: Partial<MediaSettings> = {}): MediaSettings {
  return {
    serviceUrl,
    accountSid: 'AC1',
    authToken: 'key',
    allowedHosts: [],
    isLive: false,
    limitBytes: 10_000,
    timeoutMilliseconds: 2_000,
    ...change,
  };
}

describe('a picture that came by text', () => {
  it('is fetched from the service with the key, and from its store without', async () => {
    const keys: (string | undefined)[] = [];
    const service = await serve((request, response) => {
      keys.push(request.headers.authorization);
      if (request.url === '/one') response.writeHead(307, { location: '/store' }).end();
      else showPicture(request, response);
    });
    const answer = await fetchMedia(`${service}/one`, settingsFor(service));
    expect(answer).toEqual({ outcome: 'fetched', bytes: picture });
    expect(keys).toEqual([`Basic ${Buffer.from('AC1:key').toString('base64')}`, undefined]);
  });

  it('is refused from any other host, at once or after a hop', async () => {
    let asked = 0;
    const elsewhere = await serve((request, response) => {
      asked += 1;
      showPicture(request, response);
    });
    const service = await serve((_request, response) =>
      response.writeHead(302, { location: `${elsewhere}/x` }).end(),
    );
    const settings = settingsFor(service);
    expect(await fetchMedia(`${elsewhere}/x`, settings)).toEqual({ outcome: 'refused', why: 'host' });
    expect(await fetchMedia(`${service}/x`, settings)).toEqual({ outcome: 'refused', why: 'host' });
    for (const address of ['file:///etc/passwd', 'nothing', 'http://a:b@127.0.0.1/']) {
      expect(await fetchMedia(address, settings)).toMatchObject({ outcome: 'refused' });
    }
    expect(asked).toBe(0);
  });

  it('is refused inside the house, whatever name it goes by', async () => {
    let asked = 0;
    const inside = await serve((request, response) => {
      asked += 1;
      showPicture(request, response);
    });
    const { port } = new URL(inside);
    for (const host of [`127.0.0.1:${port}`, `localhost:${port}`, `[::1]:${port}`, '169.254.169.254']) {
      const settings = settingsFor(`https://${host}`, { isLive: true });
      const answer = await fetchMedia(`https://${host}/x`, settings);
      expect(answer, host).toEqual({ outcome: 'refused', why: 'address' });
    }
    // A hop inside is refused in a demo as well: only the service itself may stand on this machine.
    const service = await serve((_request, response) =>
      response.writeHead(302, { location: `http://localhost:${port}/x` }).end(),
    );
    const settings = settingsFor(service, { allowedHosts: ['localhost'] });
    expect(await fetchMedia(`${service}/x`, settings)).toEqual({ outcome: 'refused', why: 'address' });
    expect(asked).toBe(0);
  });

  it('is refused without encryption in earnest', async () => {
    const settings = settingsFor('http://texts.example', { isLive: true });
    const answer = await fetchMedia('http://texts.example/x', settings);
    expect(answer).toEqual({ outcome: 'refused', why: 'address' });
  });

  it('is followed three hops and no more', async () => {
    const service = await serve((request, response) => {
      const left = Number(request.url?.slice(1));
      if (left === 0) showPicture(request, response);
      else response.writeHead(302, { location: `/${left - 1}` }).end();
    });
    expect(await fetchMedia(`${service}/3`, settingsFor(service))).toMatchObject({ outcome: 'fetched' });
    expect(await fetchMedia(`${service}/4`, settingsFor(service))).toEqual({
      outcome: 'refused',
      why: 'hops',
    });
  });

  it('is counted while it is read, whatever length was promised', async () => {
    const service = await serve((_request, response) => {
      response.writeHead(200, { 'content-type': 'image/jpeg' });
      const pour = () => {
        while (response.write(picture));
      };
      response.on('drain', pour);
      pour();
    });
    expect(await fetchMedia(`${service}/x`, settingsFor(service))).toEqual({
      outcome: 'refused',
      why: 'size',
    });
  });

  it('is refused where it is no picture, and asked for again where the service is not well', async () => {
    const service = await serve((request, response) => {
      if (request.url === '/page') response.writeHead(200, { 'content-type': 'text/html' }).end('<p>');
      else if (request.url === '/gone') response.writeHead(404).end();
      else if (request.url === '/ill') response.writeHead(503).end();
    });
    const ask = (path: string) =>
      fetchMedia(service + path, settingsFor(service, { timeoutMilliseconds: 300 }));
    expect(await ask('/page')).toEqual({ outcome: 'refused', why: 'type' });
    expect(await ask('/gone')).toEqual({ outcome: 'refused', why: 'gone' });
    expect(await ask('/ill')).toEqual({ outcome: 'retryLater', why: '503' });
    expect(await ask('/silent')).toMatchObject({ outcome: 'retryLater' });
  });
});
