import { describe, expect, it } from 'vitest';
import { ConfigurationError, readConfig } from './env.ts';

const live = {
  APP_MODE: 'live',
  APP_URL: 'https://trywell.firm.example/',
  APP_SECRET: 'x'.repeat(32),
  TWILIO_ACCOUNT_SID: 'AC1',
  TWILIO_AUTH_TOKEN: 'key',
  SMTP_HOST: 'mail.firm.example',
  MAIL_FROM: 'Trywell <trywell@firm.example>',
};

function problemsOf(source: Record<string, string>): string[] {
  try {
    readConfig(source);
  } catch (error) {
    if (error instanceof ConfigurationError) return error.problems;
    throw error;
  }
  return [];
}

describe('readConfig', () => {
  it('needs nothing for the demo, which talks to loopback alone', () => {
    const config = readConfig({});
    expect(config).toMatchObject({ mode: 'demo', role: 'all', appUrl: 'http://127.0.0.1:4310' });
    expect(config.texts.apiUrl).toBe('http://127.0.0.1:4311');
    expect(config.mail).toMatchObject({ host: '127.0.0.1', port: 4312 });
  });

  it('takes empty variables as absent', () => {
    expect(readConfig({ PORT: '', APP_MODE: '' })).toMatchObject({ port: 4310, mode: 'demo' });
  });

  it('runs live when every key is there, and drops the slash at the end of the address', () => {
    expect(readConfig(live)).toMatchObject({ mode: 'live', appUrl: 'https://trywell.firm.example' });
    expect(readConfig(live).texts.apiUrl).toBeNull();
  });

  it('names every key that live mode lacks', () => {
    const problems = problemsOf({ APP_MODE: 'live' });
    for (const name of Object.keys(live).filter((key) => key !== 'APP_MODE')) {
      expect(problems.join(' ')).toContain(`${name} is missing`);
    }
  });

  it.each([
    ['a half-set text key', { TWILIO_ACCOUNT_SID: 'AC1' }, 'go together'],
    ['a half-set mail key', { SMTP_USER: 'me' }, 'go together'],
    ['a demo that others could reach', { HOST: '0.0.0.0' }, 'loopback'],
    ['a port that is none', { PORT: 'seal' }, 'PORT is not usable'],
    ['an unknown mode', { APP_MODE: 'test' }, 'APP_MODE is not usable'],
    ['a live address without TLS', { ...live, APP_URL: 'http://trywell.firm.example' }, 'https://'],
    ['a short secret', { ...live, APP_SECRET: 'short' }, 'APP_SECRET'],
    ['a movable clock in live mode', { ...live, CLOCK_OFFSET_FILE: '/clock' }, 'demo mode only'],
  ])('refuses %s', (_what, source, words) => {
    expect(problemsOf(source).join(' ')).toContain(words);
  });
});
