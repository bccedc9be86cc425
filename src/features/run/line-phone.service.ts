import { DateTime } from 'luxon';
import { now } from '../../server/clock.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { newId } from '../../server/ids.ts';
import { insertNote } from './note.repository.ts';
import { touchBoard } from './run.repository.ts';
import { isLinePhone } from './run-people.repository.ts';
import { readTimeZone } from './run-people.service.ts';
import type { RunningTrial } from './running-trial.ts';
import { shiftAt } from './shift.ts';
import type { Talk, TalkResult } from './talk.service.ts';
import { tell } from './tell.service.ts';

/** As people sign a sheet: two or three letters, with or without points. */
const initials = /^\p{L}\.?\s?\p{L}\.?(\s?\p{L}\.?)?$/u;

/** The shift that is on and the day on which it began: past midnight a night shift is still that of the evening before. */
function nameShift(trial: RunningTrial, moment: number, zone: string): string {
  const shift = shiftAt(trial, moment, zone);
  const wall = DateTime.fromMillis(moment, { zone });
  const minutes = wall.hour * 60 + wall.minute;
  const beganYesterday = shift?.fromMinute != null && minutes < shift.fromMinute;
  const day = beganYesterday ? wall.minus({ days: 1 }) : wall;
  return `${shift?.name ?? ''}:${day.toISODate() ?? ''}`;
}

/** Asks a line phone once a shift who is on, with the first run that goes to it. Call it in a transaction. */
export async function askWhoIsOn(scope: ShopScope, trial: RunningTrial, personId: string): Promise<void> {
  if (!(await isLinePhone(scope, personId))) return;
  const zone = await readTimeZone(scope);
  const params = { machine: trial.machine };
  const because = `${trial.id}:${nameShift(trial, now(), zone)}`;
  await tell(scope, personId, { template: 'whoIsOn', params }, { trialId: trial.id, because });
}

/** Initials from a line phone stand as a note with the run in hand. @returns undefined where the text is none */
export async function takeInitials(talk: Talk): Promise<TalkResult | undefined> {
  const { scope, person, text, focus, trial } = talk;
  const words = text.body.trim();
  if (trial === null || !initials.test(words) || !(await isLinePhone(scope, person.personId))) {
    return undefined;
  }
  const note = { id: newId(), trialId: trial.id, runId: focus?.id ?? null, words };
  await insertNote(scope, { ...note, writtenBy: person.personId });
  await touchBoard(scope, trial.id);
  return { runId: focus?.id ?? null, isUsed: true };
}
