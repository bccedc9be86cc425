import type { Knex } from 'knex';
import { sameShop, shopRow, uniqueWhere } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('messages', (table) => {
    shopRow(table);
    table.text('channel').notNullable();
    table.text('template').notNullable();
    table.integer('template_version').notNullable();
    table.text('params').notNullable();
    table.text('language').notNullable();
    table.text('recipient').notNullable();
    table.text('subject');
    table.text('body').notNullable();
    sameShop(table, 'person_id', 'people', 'optional');
    sameShop(table, 'trial_id', 'trials', 'optional');
    sameShop(table, 'run_id', 'runs', 'optional');
    table.text('dedupe').notNullable();
    table.boolean('urgent').notNullable().defaultTo(false);
    table.text('state').notNullable();
    table.bigInteger('not_before').notNullable();
    table.integer('attempts').notNullable().defaultTo(0);
    table.bigInteger('first_attempt_at');
    table.bigInteger('lease_until');
    table.text('lease_by');
    table.text('provider_id');
    table.text('provider_status');
    table.text('error_code');
    table.integer('segments');
    table.integer('cost');
    table.bigInteger('created_at').notNullable();
    table.bigInteger('sent_at');
    table.unique(['shop_id', 'dedupe']);
    table.index(['state', 'urgent', 'not_before']);
    table.index(['shop_id', 'trial_id', 'created_at']);
    table.index(['shop_id', 'person_id', 'created_at']);
  });
  await uniqueWhere(knex, {
    name: 'messages_provider_id_once',
    table: 'messages',
    columns: ['provider_id'],
    where: 'provider_id is not null',
  });

  await knex.schema.createTable('inbox_texts', (table) => {
    shopRow(table);
    table.text('provider_id').notNullable().unique();
    sameShop(table, 'person_id', 'people', 'optional');
    table.text('from_phone');
    table.text('body').notNullable();
    table.text('media').notNullable().defaultTo('{"v":1,"items":[]}');
    table.bigInteger('sent_at').notNullable();
    table.bigInteger('received_at').notNullable();
    table.text('state').notNullable().defaultTo('new');
    table.text('intent');
    sameShop(table, 'run_id', 'runs', 'optional');
    table.integer('attempts').notNullable().defaultTo(0);
    table.index(['state', 'sent_at']);
    table.index(['shop_id', 'person_id', 'sent_at']);
  });

  await knex.schema.createTable('readings', (table) => {
    shopRow(table);
    sameShop(table, 'run_id', 'runs');
    table.integer('result').notNullable();
    table.integer('part').notNullable();
    table.double('value');
    table.integer('rejects');
    table.integer('lot');
    table.text('state').notNullable();
    table.text('source').notNullable();
    sameShop(table, 'inbox_text_id', 'inbox_texts', 'optional');
    sameShop(table, 'entered_by', 'people', 'optional');
    table.text('reason');
    sameShop(table, 'replaces_id', 'readings', 'optional');
    table.text('submission').notNullable();
    table.bigInteger('created_at').notNullable();
    table.unique(['shop_id', 'submission']);
    table.index(['shop_id', 'run_id']);
  });
  await uniqueWhere(knex, {
    name: 'readings_one_counts',
    table: 'readings',
    columns: ['shop_id', 'run_id', 'result', 'part'],
    where: "state = 'counts'",
  });

  await knex.schema.createTable('conversations', (table) => {
    shopRow(table);
    sameShop(table, 'person_id', 'people');
    table.text('state').notNullable();
    sameShop(table, 'run_id', 'runs', 'optional');
    sameShop(table, 'reading_id', 'readings', 'optional');
    sameShop(table, 'prompt_message_id', 'messages', 'optional');
    table.integer('auto_replies').notNullable().defaultTo(0);
    table.bigInteger('auto_replies_since');
    table.integer('revision').notNullable().defaultTo(1);
    table.unique(['shop_id', 'person_id']);
  });

  await knex.schema.createTable('suppressed_phones', (table) => {
    shopRow(table);
    table.text('phone_hmac').notNullable();
    table.bigInteger('created_at').notNullable();
    table.unique(['shop_id', 'phone_hmac']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['suppressed_phones', 'conversations', 'readings', 'inbox_texts', 'messages']) {
    await knex.schema.dropTable(table);
  }
}
