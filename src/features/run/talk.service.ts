import type { ExpectedItem, Reply, ReplyExpectation } from '../../lib/messages/index.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import type { FullAddressee } from '../message/addressee.repository.ts';
import type { Conversation } from '../message/conversation.repository.ts';
import type { InboxText } from '../message/inbox.repository.ts';
import type { Range } from './plausible.ts';
import type { Run } from './run.ts';
import { settingsOfRun } from './run-words.ts';
import type { RunItem, RunningTrial } from './running-trial.ts';

/** One text of one person, with all that its meaning hangs on. Everything happens in one transaction. */
export interface Talk {
  scope: ShopScope;
  person: FullAddressee;
  text: InboxText;
  conversation: Conversation;
  /** What this phone has to make or to measure: the run to make first. */
  inHand: Run[];
  /** The run that a reply without a number belongs to. */
  focus: Run | null;
  /** The trial of `focus`, else one whose crew this person is in. */
  trial: RunningTrial | null;
  reply: Reply;
}

/** What became of a text: the run it stands with, and whether it could be used. */
export interface TalkResult {
  runId: string | null;
  isUsed: boolean;
}

/** What a phone is asked, as `readReply` takes it. */
export function expectationOf(
  trial: RunningTrial,
  about: {
    run: Run;
    items: readonly RunItem[];
    inHand: readonly Run[];
    ranges: ReadonlyMap<number, Range>;
    language: ReplyExpectation['language'];
  },
): ReplyExpectation {
  const { run, items, inHand, ranges, language } = about;
  const plausible = Object.fromEntries(
    items.flatMap(({ key, result }): [string, [number, number]][] => {
      const range = ranges.get(result);
      return range ? [[key, [range.low, range.high]]] : [];
    }),
  );
  return {
    items: items.map(toExpectedItem),
    openRuns: inHand.map(({ number, state }) => ({
      run: number,
      state: state === 'asked' ? 'make' : 'measure',
    })),
    settings: settingsOfRun(trial, run),
    plausible,
    ...(language === undefined ? {} : { language }),
  };
}

function toExpectedItem({ key, kind, readings, lotSize, name, unit }: RunItem): ExpectedItem {
  const names = [name, unit].filter((word) => word !== '');
  return { key, kind, readings, names, ...(lotSize === null ? {} : { lotSize }) };
}

/** The numbers of a reply as they are read back to whoever sent them. */
export function writeSent(values: Reply['values'] = {}): string {
  return Object.values(values)
    .map((numbers) => numbers.join(' '))
    .join(', ');
}
