import { now } from '../../server/clock.ts';
import { listActivity, recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { findPersonInReach } from './find-person.service.ts';
import type { Person } from './person.ts';
import { type PersonalRows, readPersonalRows } from './person-export.repository.ts';
import type { PeopleReader } from './reach.ts';

const linesAtOnce = 500;

async function readWholeLog(scope: ShopScope, personId: string) {
  const lines = [];
  let before: number | undefined;
  for (;;) {
    const page = await listActivity(scope, {
      limit: linesAtOnce,
      subjectId: personId,
      ...(before === undefined ? {} : { before }),
    });
    lines.push(
      ...page.map(({ seq, at, kind, details }) => ({ seq, at, kind, details: JSON.parse(details) })),
    );
    const last = page.at(-1);
    if (page.length < linesAtOnce || !last) return lines;
    before = last.seq;
  }
}

/** All that is held about a person, to be handed to them. */
export interface PersonExport {
  exportedAt: number;
  person: Omit<Person, 'revision' | 'joined'>;
  rows: PersonalRows[];
  /** What the log says happened to them: times, codes and figures. */
  log: { seq: number; at: number; kind: string; details: unknown }[];
}

export function exportPerson(scope: ShopScope, id: string, reader: PeopleReader): Promise<PersonExport> {
  return inTransaction(scope, async (inner) => {
    const { revision, joined, ...person } = await findPersonInReach(inner, id, reader);
    await recordActivity(inner, { kind: 'person.exported', subjectId: id });
    return {
      exportedAt: now(),
      person,
      rows: await readPersonalRows(inner, id),
      log: await readWholeLog(inner, id),
    };
  });
}
