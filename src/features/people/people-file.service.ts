import type { ShopScope } from '../../server/db/scope.ts';
import { writeCsv } from './csv.ts';
import { importColumns } from './import-columns.ts';
import { listPeoplePage } from './people.repository.ts';
import { listPeopleSchema } from './people.schema.ts';
import type { Person } from './person.ts';
import { formatWallTime } from './work-hours.ts';

function toRow(person: Person): string[] {
  const role = person.kind === 'line phone' ? 'line phone' : person.roles.join(' / ');
  const [first] = person.workSpans;
  const hours = first
    ? [first.days.join(','), formatWallTime(first.fromMinute), formatWallTime(first.toMinute % 1440)]
    : ['', '', ''];
  return [person.name, person.phone ?? '', person.email ?? '', person.language, role, ...hours];
}

/** Everybody who is active, as a file that the import reads back. Only for readers who may see numbers. */
export async function exportPeople(scope: ShopScope): Promise<string> {
  const rows: string[][] = [[...importColumns]];
  let after: string | undefined;
  for (;;) {
    const list = listPeopleSchema.parse({ limit: 100, after });
    const page = await listPeoplePage(scope, { ...list, operatorsOnly: false });
    rows.push(...page.people.map(toRow));
    if (page.next === null) return writeCsv(rows);
    after = page.next;
  }
}
