import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { type Addressee, decideSending } from './send-guard.ts';
import { templates } from './templates.ts';

const timeZone = 'Europe/Warsaw';
function at(iso: string): number {
  return DateTime.fromISO(iso, { zone: timeZone }).toMillis();
}

const phone = '+48601000001';
const ana: Addressee = {
  phone,
  email: 'ana@shop.example',
  consent: 'agreed',
  active: true,
  isSuppressed: false,
  hours: { spans: [{ days: [1, 2, 3, 4, 5], fromMinute: 360, toMinute: 840 }], quiet: null, timeZone },
  lastTextedAt: null,
};
const text: Parameters<typeof decideSending>[0] = {
  template: templates.textsCheck,
  recipient: phone,
  urgent: false,
};
const consent = { ...text, template: templates.consent };
// 2026-03-06 is a Friday.
const atWork = at('2026-03-06T10:00');
const evening = at('2026-03-06T20:00');
const monday = at('2026-03-09T06:00');

function decide(change: Partial<Addressee>, message: Partial<typeof text> = {}, now = atWork) {
  return decideSending({ ...text, ...message }, { ...ana, ...change }, now);
}

describe('before a text goes out', () => {
  it('lets it go to somebody who agreed and is at work', () => {
    expect(decide({})).toEqual({ decision: 'send' });
  });

  it.each(['unasked', 'asked', 'opted out'] as const)('stops at a person who is %s', (state) => {
    const code = state === 'opted out' ? 'opted-out' : 'no-consent';
    expect(decide({ consent: state })).toEqual({ decision: 'fail', code });
    // Not even a safety text.
    expect(decide({ consent: state }, { urgent: true })).toEqual({ decision: 'fail', code });
  });

  it('asks for consent only who is being asked', () => {
    expect(decideSending(consent, { ...ana, consent: 'asked' }, atWork)).toEqual({ decision: 'send' });
    for (const state of ['unasked', 'agreed'] as const) {
      expect(decideSending(consent, { ...ana, consent: state }, atWork)).toEqual({
        decision: 'fail',
        code: 'no-consent',
      });
    }
  });

  it('stops at a number that opted out, changed, or belongs to nobody here any more', () => {
    expect(decide({ isSuppressed: true })).toEqual({ decision: 'fail', code: 'opted-out' });
    expect(decide({ phone: '+48601000002' })).toEqual({ decision: 'fail', code: 'address-changed' });
    expect(decide({ phone: null })).toEqual({ decision: 'fail', code: 'address-changed' });
    expect(decide({ active: false })).toEqual({ decision: 'fail', code: 'not-active' });
    expect(decideSending(text, null, atWork)).toEqual({ decision: 'fail', code: 'no-consent' });
  });

  it('waits for the next shift, over a weekend too, unless it is urgent', () => {
    expect(decide({}, {}, evening)).toEqual({ decision: 'wait', until: monday });
    expect(decide({}, { urgent: true }, evening)).toEqual({ decision: 'send' });
    expect(decide({ hours: { ...ana.hours, spans: [] } })).toEqual({ decision: 'fail', code: 'no-hours' });
  });

  it('answers a text of the last ten minutes at any hour', () => {
    const practice = { template: templates.practice };
    expect(decide({ lastTextedAt: evening - 60_000 }, practice, evening)).toEqual({ decision: 'send' });
    expect(decide({ lastTextedAt: evening - 660_000 }, practice, evening)).toEqual({
      decision: 'wait',
      until: monday,
    });
    expect(decide({ lastTextedAt: evening - 60_000 }, {}, evening)).toEqual({
      decision: 'wait',
      until: monday,
    });
  });

  it('keeps the quiet hours of the shop', () => {
    const round = [{ days: [1, 2, 3, 4, 5, 6, 7], fromMinute: 0, toMinute: 0 }];
    const quiet = { fromMinute: 22 * 60, toMinute: 5 * 60 };
    const hours = { spans: round, quiet, timeZone };
    expect(decide({ hours }, {}, at('2026-03-06T21:59'))).toEqual({ decision: 'send' });
    expect(decide({ hours }, {}, at('2026-03-06T23:30'))).toEqual({
      decision: 'wait',
      until: at('2026-03-07T05:00'),
    });
    // The night that loses an hour.
    expect(decide({ hours }, {}, at('2026-03-29T01:30'))).toEqual({
      decision: 'wait',
      until: at('2026-03-29T05:00'),
    });
    const nightShift = [{ days: [5], fromMinute: 23 * 60, toMinute: 4 * 60 }];
    expect(decide({ hours: { spans: nightShift, quiet, timeZone } })).toEqual({
      decision: 'fail',
      code: 'no-hours',
    });
  });
});

describe('before a mail goes out', () => {
  it('asks for nothing', () => {
    const mail = { template: templates.invitation, recipient: 'a@shop.example', urgent: false };
    expect(decideSending(mail, { ...ana, consent: 'unasked' }, evening)).toEqual({ decision: 'send' });
    expect(decideSending(mail, null, evening)).toEqual({ decision: 'send' });
  });
});
