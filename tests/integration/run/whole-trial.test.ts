import { describe, expect, it } from 'vitest';
import { listActivity } from '../../../src/server/db/activity-log.ts';
import { openCrew, passTime, received } from '../message/crew.ts';
import {
  countingOf,
  lastText,
  phoneOf,
  reply,
  runNow,
  runsOf,
  startTrial,
  statesOf,
  trialNow,
  work,
} from './text-fixture.ts';

const minute = 60_000;
const crew = openCrew();

describe('a trial of eleven runs by text', () => {
  it('goes from the first prompt to the usual settings with every kind of reply', async () => {
    const shop = await startTrial(crew);
    expect(await statesOf(shop)).toEqual(['asked', ...Array(10).fill('waiting')]);
    const prompt = await lastText(shop);
    expect(prompt).toMatch(
      /^Line 3, run 1 of 11\nJAW TEMP \d+\nDWELL [\d.]+\nPRESS [\d.]+\nMake 1, mark HOLD\.\n/,
    );
    expect(prompt).toContain('seal strength: text the number, like 35');

    await passTime(5 * minute);
    await reply(shop, '41.5');
    expect(await statesOf(shop)).toEqual(['done', 'asked', ...Array(9).fill('waiting')]);
    expect(await lastText(shop)).toMatch(/^Run 1 saved: 41\.5\. Wrong\? .*\nLine 3, run 2 of 11\n/s);

    // Run 2: put off, then a number with a comma and a unit.
    await passTime(5 * minute);
    await reply(shop, 'later 30');
    expect(await lastText(shop)).toMatch(/^Run 2 waits\. .* 30 min/);
    await passTime(31 * minute);
    await reply(shop, '40,8 N');
    expect(await statesOf(shop)).toEqual(['done', 'done', 'asked', ...Array(8).fill('waiting')]);

    // Run 3: far from the others, and right.
    await passTime(5 * minute);
    await reply(shop, '4.15');
    expect((await runNow(shop, 3)).state).toBe('doubtful');
    expect(await lastText(shop)).toMatch(/^Run 3: you sent 4\.15\. That is far/);
    await reply(shop, 'ok');
    expect(await countingOf((await runNow(shop, 3)).id)).toEqual([4.15]);

    // Run 4: far from the others, and a slip.
    await passTime(5 * minute);
    await reply(shop, '425');
    await reply(shop, '42.5');
    expect(await countingOf((await runNow(shop, 4)).id)).toEqual([42.5]);

    // Run 5: skipped without a reason.
    await reply(shop, 'SKIP');
    expect((await runNow(shop, 5)).state).toBe('skipped');
    expect(await lastText(shop)).toMatch(/^Run 5 is skipped\. .*\nLine 3, run 6 of 11\n/s);

    // Run 6: not readable, then made, then its number; and run 4 put right.
    await passTime(5 * minute);
    await reply(shop, 'the seal looks fine to me');
    expect(await lastText(shop)).toMatch(/^Sorry, I could not read that\. Run 6\./);
    const before = (await received(crew)).length;
    await reply(shop, 'what do you mean');
    expect((await received(crew)).length).toBe(before);
    await reply(shop, 'FIX 4 41.9');
    expect(await countingOf((await runNow(shop, 4)).id)).toEqual([41.9]);
    expect(await lastText(shop)).toMatch(/^Run 4 saved: 41\.9\./);
    await reply(shop, 'done');
    expect((await runNow(shop, 6)).state).toBe('made');
    expect(await lastText(shop)).toMatch(/^Thanks\. Now run 6\./);
    await reply(shop, '39.9');

    // Run 7: a problem, then the number. No run goes out until it is dealt with.
    await passTime(5 * minute);
    await reply(shop, 'PROBLEM jaw not heating');
    expect(await lastText(shop)).toMatch(/^Noted\. No more runs till Dana has looked/);
    expect(await lastText(shop, await phoneOf(shop.dana.personId))).toBe(
      'Line 3, run 7: Ana wrote: jaw not heating. No runs go out till you deal with it on the board.',
    );
    await reply(shop, '38.8');
    expect(await statesOf(shop)).toEqual([
      ...['done', 'done', 'done', 'done', 'skipped', 'done', 'done'],
      ...Array(4).fill('waiting'),
    ]);
    await crew.shop.db('problems').where({ trial_id: shop.trialId }).update({ settled_at: 1 });
    await passTime(minute);
    await work(crew);
    expect((await runNow(shop, 8)).state).toBe('asked');

    // Run 8: a setting that cannot be reached, then the number; 9: a setting texted instead of the result.
    await passTime(5 * minute);
    await reply(shop, 'cant jaw temp 155');
    expect(await lastText(shop)).toMatch(/^Noted: JAW TEMP 155\./);
    await reply(shop, '37');
    await passTime(5 * minute);
    const [temp] = JSON.parse((await runNow(shop, 9)).planned).values;
    await reply(shop, String(temp));
    expect(await lastText(shop)).toMatch(/That is also a setting/);
    await reply(shop, 'no');
    expect((await runNow(shop, 9)).state).toBe('made');
    await reply(shop, '36.5');

    // Run 10: a new batch first.
    await passTime(5 * minute);
    await reply(shop, 'new batch 77-B');
    expect(await lastText(shop)).toBe('New batch noted: 77-B. Carry on.');
    await reply(shop, 'run 10: 35.5');
    const stretches = await crew.shop.db('stretches').where({ trial_id: shop.trialId }).orderBy('n');
    expect(stretches.map(({ kind, words }) => [kind, words])).toEqual([
      ['start', ''],
      ['new batch', '77-B'],
    ]);
    expect((await runNow(shop, 10)).stretch_id).toBe(stretches[1]?.id);

    // Run 11: the last. The readings are in, and the machine goes back to its usual settings.
    await passTime(5 * minute);
    await reply(shop, '34');
    await passTime(2_000);
    await work(crew);
    expect((await trialNow(shop)).state).toBe('readings in');
    const texts = await received(crew);
    expect(texts.at(-2)).toMatch(/^Run 11 saved: 34\./);
    expect(texts.at(-1)).toBe(
      'Line 3: all 11 runs are in. Thank you. Put the usual settings back: JAW TEMP 150, DWELL 0.8, PRESS 3.5. Text DONE.',
    );
    await reply(shop, 'DONE');
    expect(await lastText(shop)).toBe('Thanks. Line 3 is back to usual.');
    expect((await trialNow(shop)).set_back_at).not.toBeNull();

    const runs = await runsOf(shop);
    const counting = await Promise.all(runs.map(({ id }: { id: string }) => countingOf(id)));
    expect(counting).toEqual([
      [41.5],
      [40.8],
      [4.15],
      [41.9],
      [],
      [39.9],
      [38.8],
      [37],
      [36.5],
      [35.5],
      [34],
    ]);
    const kinds = (await listActivity(shop.scope, { limit: 100, trialId: shop.trialId })).map(
      ({ kind }) => kind,
    );
    expect(kinds).toContain('reading.corrected');
    expect(kinds).toContain('reading.confirmed');
    expect(kinds).toContain('trial.readings-in');
  });
});
