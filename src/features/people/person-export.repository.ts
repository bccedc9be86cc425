import type { ShopScope } from '../../server/db/scope.ts';

interface PersonalTable {
  table: string;
  /** The column that points at the person. */
  column: string;
  /** What of a row is about the person and may be handed to them: no hashes, nobody else's data. */
  fields: readonly string[];
}

/** Every place that points at a person. A test reads the schema and refuses one that is missing here. */
export const personalTables: readonly PersonalTable[] = [
  { table: 'person_roles', column: 'person_id', fields: ['role'] },
  {
    table: 'sessions',
    column: 'person_id',
    fields: ['device', 'created_at', 'last_seen_at', 'expires_at'],
  },
  {
    table: 'links',
    column: 'person_id',
    fields: ['purpose', 'created_at', 'expires_at', 'used_at', 'revoked_at'],
  },
  {
    table: 'api_tokens',
    column: 'person_id',
    fields: ['name', 'prefix', 'created_at', 'expires_at', 'last_used_at', 'revoked_at'],
  },
  {
    table: 'messages',
    column: 'person_id',
    fields: [
      'channel',
      'template',
      'language',
      'recipient',
      'subject',
      'body',
      'state',
      'created_at',
      'sent_at',
    ],
  },
  {
    table: 'inbox_texts',
    column: 'person_id',
    fields: ['body', 'media', 'intent', 'sent_at', 'received_at'],
  },
  { table: 'conversations', column: 'person_id', fields: ['state'] },
  {
    table: 'runs',
    column: 'person_id',
    fields: ['trial_id', 'number', 'state', 'asked_at', 'made_at', 'closed_at'],
  },
  {
    table: 'runs',
    column: 'measurer_id',
    fields: ['trial_id', 'number', 'state', 'measured_at', 'closed_at'],
  },
  {
    table: 'readings',
    column: 'entered_by',
    fields: ['run_id', 'result', 'part', 'value', 'rejects', 'lot', 'source', 'reason', 'created_at'],
  },
  { table: 'trials', column: 'owner_id', fields: ['number', 'title', 'machine', 'state', 'created_at'] },
  { table: 'models', column: 'made_by', fields: ['trial_id', 'name', 'spec', 'created_at', 'updated_at'] },
  { table: 'plans', column: 'chosen_by', fields: ['trial_id', 'n', 'created_at'] },
  { table: 'decisions', column: 'decided_by', fields: ['trial_id', 'outcome', 'note', 'decided_at'] },
  { table: 'answers', column: 'updated_by', fields: ['trial_id', 'version', 'updated_at'] },
  { table: 'phrases', column: 'written_by', fields: ['purpose', 'texts', 'created_at'] },
  {
    table: 'reviews',
    column: 'asked_by',
    fields: ['trial_id', 'subject', 'round', 'state', 'asked_at'],
  },
  {
    table: 'reviews',
    column: 'decided_by',
    fields: ['trial_id', 'subject', 'round', 'state', 'decided_at'],
  },
  {
    table: 'review_comments',
    column: 'written_by',
    fields: ['review_id', 'place', 'words', 'created_at', 'settled_at'],
  },
  {
    table: 'photos',
    column: 'sent_by',
    fields: ['run_id', 'width', 'height', 'source', 'created_at'],
  },
  { table: 'notes', column: 'written_by', fields: ['trial_id', 'run_id', 'words', 'created_at'] },
  {
    table: 'problems',
    column: 'raised_by',
    fields: ['trial_id', 'run_id', 'words', 'raised_at', 'settled_at'],
  },
  { table: 'problems', column: 'settled_by', fields: ['trial_id', 'run_id', 'settled_at'] },
  { table: 'people', column: 'asked_by', fields: ['id'] },
];

export interface PersonalRows {
  table: string;
  as: string;
  rows: Record<string, unknown>[];
}

/** All rows of the shop that point at a person, cut to what may be handed out. */
export async function readPersonalRows(scope: ShopScope, personId: string): Promise<PersonalRows[]> {
  const found: PersonalRows[] = [];
  for (const { table, column, fields } of personalTables) {
    const rows: Record<string, unknown>[] = await scope
      .db(table)
      .where({ shop_id: scope.shopId, [column]: personId })
      .orderBy('id')
      .select([...fields]);
    found.push({ table, as: column, rows });
  }
  return found;
}
