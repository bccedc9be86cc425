import { describe, expect, it } from 'vitest';
import { nameDevice } from './device-name.ts';

const like = 'Mozilla/5.0';
const webkit = 'AppleWebKit/537.36 (KHTML, like Gecko)';

describe('nameDevice', () => {
  it.each([
    [`${like} (Windows NT 10.0; Win64; x64) ${webkit} Chrome/131.0.0.0 Safari/537.36`, 'Chrome', 'Windows'],
    [
      `${like} (Windows NT 10.0; Win64; x64) ${webkit} Chrome/131.0.0.0 Safari/537.36 Edg/131.0.0.0`,
      'Edge',
      'Windows',
    ],
    [`${like} (X11; Linux x86_64; rv:133.0) Gecko/20100101 Firefox/133.0`, 'Firefox', 'Linux'],
    [
      `${like} (iPhone; CPU iPhone OS 18_1 like Mac OS X) ${webkit} Version/18.1 Mobile/15E148 Safari/604.1`,
      'Safari',
      'iPhone',
    ],
    [
      `${like} (Linux; Android 14; Pixel 8) ${webkit} Chrome/131.0.0.0 Mobile Safari/537.36`,
      'Chrome',
      'Android',
    ],
    [
      `${like} (Linux; Android 14; SM-S918B) ${webkit} SamsungBrowser/26.0 Chrome/122.0.0.0 Mobile Safari/537.36`,
      'Samsung',
      'Android',
    ],
    ['curl/8.5.0', null, null],
    ['', null, null],
  ])('reads %s', (description, browser, system) => {
    expect(nameDevice(description)).toEqual({ browser, system });
  });
});
