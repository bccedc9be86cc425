import { describe, expect, it } from 'vitest';
import { readFakesSettings } from './settings.ts';

const least = { APP_URL: 'http://127.0.0.1:4310' };

describe('the settings of the stand-ins', () => {
  it('need little and default the ports', () => {
    expect(readFakesSettings(least)).toMatchObject({
      httpPort: 4311,
      smtpPort: 4312,
      webhookTarget: 'http://127.0.0.1:4310',
      phones: [],
      numbers: [],
    });
  });

  it('name phones', () => {
    const { phones } = readFakesSettings({
      ...least,
      FAKES_PHONES: '+15550100101=Ana,+15550100102=Minh Tran',
    });
    expect(phones).toEqual([
      { phone: '+15550100101', name: 'Ana' },
      { phone: '+15550100102', name: 'Minh Tran' },
    ]);
  });

  it('refuse to call anybody outside this machine', () => {
    expect(() => readFakesSettings({ ...least, APP_URL: 'https://trywell.example' })).toThrow();
    const signedElsewhere = {
      ...least,
      APP_URL: 'https://trywell.example',
      FAKES_WEBHOOK_TARGET: 'http://127.0.0.1:9',
    };
    expect(readFakesSettings(signedElsewhere).publicUrl).toBe('https://trywell.example');
    expect(() =>
      readFakesSettings({ ...signedElsewhere, FAKES_WEBHOOK_TARGET: 'http://10.0.0.1:9' }),
    ).toThrow();
  });
});
