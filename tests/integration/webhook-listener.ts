import { createServer, type IncomingHttpHeaders } from 'node:http';
import type { AddressInfo } from 'node:net';

export interface HeardCall {
  path: string;
  headers: IncomingHttpHeaders;
  parameters: Record<string, string>;
}

/** A stand-in for the product's webhooks that writes down what it hears. */
export interface WebhookListener {
  url: string;
  heard: HeardCall[];
  /** What it answers from now on. */
  answerWith(status: number): void;
  stop(): Promise<void>;
}

export async function startWebhookListener(): Promise<WebhookListener> {
  const heard: HeardCall[] = [];
  let status = 200;
  const server = createServer((request, response) => {
    const chunks: Buffer[] = [];
    request.on('data', (chunk: Buffer) => chunks.push(chunk));
    request.on('end', () => {
      const form = new URLSearchParams(Buffer.concat(chunks).toString('utf8'));
      heard.push({ path: request.url ?? '', headers: request.headers, parameters: Object.fromEntries(form) });
      response.writeHead(status).end();
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    heard,
    answerWith: (next) => {
      status = next;
    },
    stop: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}
