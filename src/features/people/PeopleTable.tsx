import { Icon, type IconName } from '../../components/ui/Icon.tsx';
import { Table, type TableColumn } from '../../components/ui/Table.tsx';
import { languageNames } from '../../i18n/languages.ts';
import type { Translate } from '../../i18n/translator.ts';
import { describeHours } from './describe-hours.ts';
import type { ListPeople } from './people.schema.ts';
import type { ConsentState } from './person.ts';
import type { PublicPerson } from './public-person.ts';

interface Props {
  readonly people: readonly PublicPerson[];
  readonly list: Pick<ListPeople, 'sort' | 'direction'>;
  /** Where a press on a column leads. */
  readonly sortHref: (sort: ListPeople['sort']) => string;
  readonly t: Translate;
}

const icons = {
  unasked: 'question',
  asked: 'wait',
  agreed: 'good',
  'opted out': 'stop',
} as const satisfies Record<ConsentState, IconName>;

function describeTexts(person: PublicPerson, t: Translate): string {
  return person.phoneShown === null ? t('people:noPhone') : t(`people:consent.${person.consent}`);
}

function describeRole(person: PublicPerson, t: Translate): string {
  if (person.kind === 'line phone') return t('people:linePhone');
  return person.roles.map((role) => t(`people:role.${role}`)).join(', ');
}

/** Who is here, drawn on the server: it needs no script. */
export function PeopleTable({ people, list, sortHref, t }: Props) {
  const columns: TableColumn<PublicPerson>[] = [
    {
      key: 'name',
      header: t('people:column.name'),
      rowHeader: true,
      sortHref: sortHref('name'),
      cell: (person) => (
        <a className="whitespace-nowrap" href={`/people/${person.id}`}>
          {person.name}
        </a>
      ),
    },
    {
      key: 'roles',
      header: t('people:column.roles'),
      cell: (person) => (
        <span className="whitespace-nowrap">
          {describeRole(person, t)}
          {person.safetyPerson && <span className="block text-steel">{t('people:safety')}</span>}
        </span>
      ),
    },
    {
      key: 'consent',
      header: t('people:column.texts'),
      sortHref: sortHref('consent'),
      cell: (person) => (
        <span className="inline-flex items-center gap-2 whitespace-nowrap">
          <Icon name={person.phoneShown === null ? 'minus' : icons[person.consent]} size={16} />
          {describeTexts(person, t)}
        </span>
      ),
    },
    {
      key: 'phone',
      header: t('people:column.phone'),
      cell: (person) => <span className="figures whitespace-nowrap">{person.phoneShown}</span>,
    },
    {
      key: 'language',
      header: t('people:column.language'),
      sortHref: sortHref('language'),
      cell: (person) => languageNames[person.language],
    },
    {
      key: 'hours',
      header: t('people:column.hours'),
      cell: (person) =>
        describeHours(person.workSpans, t).map((line) => (
          <span key={line} className="block whitespace-nowrap">
            {line}
          </span>
        )),
    },
  ];
  return (
    <Table
      id="people"
      caption={t('people:table')}
      captionHidden
      columns={columns}
      rows={people}
      rowKey={(person) => person.id}
      empty={t('people:noneFound')}
      sort={{ key: list.sort, direction: list.direction }}
    />
  );
}
