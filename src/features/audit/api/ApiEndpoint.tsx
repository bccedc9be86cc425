import { Table } from '../../../components/ui/Table.tsx';
import type { Translate } from '../../../i18n/translator.ts';
import type { DescribedField } from './describe-fields.ts';
import type { ShownEndpoint } from './show-endpoints.ts';

interface Props {
  readonly endpoint: ShownEndpoint;
  readonly t: Translate;
}

function Fields({
  id,
  caption,
  fields,
  t,
}: {
  readonly id: string;
  readonly caption: string;
  readonly fields: readonly DescribedField[];
  readonly t: Translate;
}) {
  if (fields.length === 0) return null;
  return (
    <Table
      id={id}
      caption={caption}
      close
      columns={[
        {
          key: 'name',
          header: t('audit-pack:api.field'),
          cell: ({ name }) => <code>{name}</code>,
          rowHeader: true,
        },
        { key: 'type', header: t('audit-pack:api.type'), cell: ({ type }) => <code>{type}</code> },
        {
          key: 'required',
          header: t('audit-pack:api.required'),
          cell: ({ required }) => t(required ? 'audit-pack:api.yes' : 'audit-pack:api.no'),
        },
      ]}
      rows={fields}
      rowKey={({ name }) => name}
      empty=""
    />
  );
}

/** One call of the API: who may make it, what it takes and what it answers. */
export function ApiEndpoint({ endpoint, t }: Props) {
  const { id, method, path, permission, byToken, parameters, body, answer, example } = endpoint;
  return (
    <section id={id} className="sheet grid gap-4" aria-labelledby={`${id}-name`}>
      <h3 id={`${id}-name`} className="break-all">
        <code>
          {method} {path}
        </code>
      </h3>
      <p className="text-steel">
        {t('audit-pack:api.permission', { permission })} {byToken && t('audit-pack:api.byToken')}
      </p>
      {byToken && (
        <p className="break-all">
          <code>{example}</code>
        </p>
      )}
      <Fields id={`${id}-parameters`} caption={t('audit-pack:api.parameters')} fields={parameters} t={t} />
      <Fields id={`${id}-body`} caption={t('audit-pack:api.body')} fields={body} t={t} />
      <Fields id={`${id}-answer`} caption={t('audit-pack:api.answer')} fields={answer} t={t} />
    </section>
  );
}
