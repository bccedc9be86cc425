import type { Browser } from 'playwright-core';
import { afterAll, beforeAll } from 'vitest';
import { launchBrowser } from './browser.ts';
import { type AppWishes, type RunningApp, startApp } from './running-app.ts';

/** Starts the built product and a browser for all tests of a file, and ends both after them. */
export function withAppInBrowser(wishes: AppWishes = {}): {
  readonly running: RunningApp;
  readonly browser: Browser;
} {
  let running: RunningApp | undefined;
  let browser: Browser | undefined;
  beforeAll(async () => {
    [running, browser] = await Promise.all([startApp(wishes), launchBrowser()]);
  });
  afterAll(async () => {
    await browser?.close();
    await running?.stop();
  });
  function present<Value>(value: Value | undefined): Value {
    if (value === undefined) throw new RangeError('withAppInBrowser: nothing runs before the tests do');
    return value;
  }
  return {
    get running() {
      return present(running);
    },
    get browser() {
      return present(browser);
    },
  };
}
