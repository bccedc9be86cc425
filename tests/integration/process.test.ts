import { readdirSync, readlinkSync } from 'node:fs';
import { request } from 'node:http';
import { setTimeout as wait } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type RunningApp, startApp } from '../setup/running-app.ts';

let running: RunningApp;
beforeAll(async () => {
  running = await startApp();
}, 60_000);
afterAll(() => running.stop());

function openFiles(pid: number): string[] {
  const folder = `/proc/${pid}/fd`;
  return readdirSync(folder).flatMap((handle) => {
    try {
      return [readlinkSync(`${folder}/${handle}`)];
    } catch {
      // Closed between the two calls.
      return [];
    }
  });
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}

const form = 'language=pl&next=%2F';

/** Posts the language form in two halves with a pause between them, as a slow line would. */
function postSlowly(url: string, betweenHalves: () => Promise<void>): Promise<number | undefined> {
  return new Promise((resolve, reject) => {
    const outgoing = request(`${url}/language`, {
      method: 'POST',
      headers: {
        Origin: url,
        'Content-Type': 'application/x-www-form-urlencoded',
        'Content-Length': form.length,
      },
    });
    outgoing.on('response', (response) => {
      response.resume();
      resolve(response.statusCode);
    });
    outgoing.on('error', reject);
    outgoing.write(form.slice(0, 5));
    betweenHalves().then(() => outgoing.end(form.slice(5)), reject);
  });
}

describe('the running process', () => {
  it('answers the front page and says that it is well', async () => {
    const page = await fetch(running.url);
    expect(page.status).toBe(200);
    expect(await page.text()).toContain('</html>');
    // The worker's first sign of life may take a moment.
    await expect
      .poll(async () => (await fetch(`${running.url}/api/health`)).json(), { timeout: 10_000 })
      .toEqual({ ok: true });
  });

  it('holds its database file open once, whoever asks', async () => {
    await Promise.all(Array.from({ length: 20 }, () => fetch(`${running.url}/api/health`)));
    const handles = openFiles(running.app.process.pid ?? 0).filter((file) => file.endsWith('trywell.sqlite'));
    expect(handles).toHaveLength(1);
  });

  it('finishes a slow request after SIGTERM, exits 0 and leaves nothing running', {
    timeout: 60_000,
  }, async () => {
    const own = await startApp();
    const pid = own.app.process.pid ?? 0;
    const status = await postSlowly(own.url, async () => {
      await wait(200);
      own.app.process.kill('SIGTERM');
      await wait(500);
      expect(isAlive(pid)).toBe(true);
    });
    expect(status).toBe(303);
    expect(await own.stop()).toBe(0);
    expect(isAlive(pid)).toBe(false);
  });

  it('keeps addresses, tokens and phones out of its log', async () => {
    await fetch(`${running.url}/nothing/secret-token-in-path?phone=%2B12025550142`);
    await wait(100);
    const log = running.app.errors();
    expect(log).toContain('"event":"request"');
    expect(log).not.toContain('secret-token-in-path');
    expect(log).not.toContain('2025550142');
  });
});
