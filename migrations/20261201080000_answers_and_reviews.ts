import type { Knex } from 'knex';
import {
  allowChanges,
  refuseChanges,
  sameShop,
  shopRow,
  uniqueWhere,
} from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('answers', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.integer('version').notNullable();
    table.text('question_versions').notNullable();
    table.text('document').notNullable();
    table.text('frozen_hash');
    sameShop(table, 'updated_by', 'people');
    table.bigInteger('created_at').notNullable();
    table.bigInteger('updated_at').notNullable();
    table.unique(['shop_id', 'trial_id']);
  });
  // What a trial was started on is evidence from then on.
  await refuseChanges(knex, 'answers', 'frozen_hash');

  await knex.schema.createTable('phrases', (table) => {
    shopRow(table);
    table.text('purpose').notNullable();
    table.text('texts').notNullable();
    table.text('hash').notNullable();
    sameShop(table, 'written_by', 'people');
    table.bigInteger('created_at').notNullable();
    table.unique(['shop_id', 'purpose', 'hash']);
  });

  await knex.schema.createTable('reviews', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.text('subject').notNullable();
    table.text('subject_hash').notNullable();
    table.integer('round').notNullable();
    table.text('state').notNullable();
    sameShop(table, 'asked_by', 'people');
    table.bigInteger('asked_at').notNullable();
    sameShop(table, 'decided_by', 'people', 'optional');
    table.bigInteger('decided_at');
    table.unique(['shop_id', 'trial_id', 'subject', 'round']);
  });
  await uniqueWhere(knex, {
    name: 'reviews_one_asked',
    table: 'reviews',
    columns: ['shop_id', 'trial_id', 'subject'],
    where: "state = 'asked'",
  });

  await knex.schema.createTable('review_comments', (table) => {
    shopRow(table);
    sameShop(table, 'review_id', 'reviews');
    table.text('place').notNullable();
    table.text('words').notNullable();
    sameShop(table, 'written_by', 'people');
    table.bigInteger('created_at').notNullable();
    table.bigInteger('settled_at');
    table.index(['shop_id', 'review_id']);
  });
}

export async function down(knex: Knex): Promise<void> {
  await allowChanges(knex, 'answers');
  for (const table of ['review_comments', 'reviews', 'phrases', 'answers']) {
    await knex.schema.dropTable(table);
  }
}
