import type { Knex } from 'knex';
import { sameShop, shopRow, uniqueWhere } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('shops', (table) => {
    table.text('id').primary();
    table.text('name').notNullable();
    table.text('time_zone').notNullable();
    table.text('language').notNullable();
    table.text('currency').notNullable();
    table.text('text_number').unique();
    table.integer('quiet_from_minute');
    table.integer('quiet_to_minute');
    table.text('plan_review').notNullable().defaultTo('hazard');
    table.text('verdict_review').notNullable().defaultTo('never');
    table.text('adoption_review').notNullable().defaultTo('never');
    table.text('review_statement');
    table.boolean('plain_letters').notNullable().defaultTo(true);
    table.integer('keep_texts_days').notNullable().defaultTo(180);
    table.integer('monthly_text_limit');
    table.bigInteger('log_seq').notNullable().defaultTo(0);
    table.text('log_hash').notNullable().defaultTo('');
    table.integer('revision').notNullable().defaultTo(1);
    table.bigInteger('created_at').notNullable();
    table.bigInteger('updated_at').notNullable();
  });

  await knex.schema.createTable('people', (table) => {
    shopRow(table);
    table.text('kind').notNullable();
    table.text('name').notNullable();
    table.text('name_search').notNullable();
    table.text('email').unique();
    table.text('phone');
    table.text('language').notNullable();
    table.text('theme').notNullable().defaultTo('auto');
    table.boolean('plain_letters').notNullable().defaultTo(true);
    table.text('password_hash');
    table.text('work_hours').notNullable();
    table.text('consent').notNullable().defaultTo('unasked');
    table.bigInteger('consent_at');
    table.integer('consent_wording');
    table.text('consent_how');
    sameShop(table, 'asked_by', 'people', 'optional');
    table.boolean('safety_person').notNullable().defaultTo(false);
    table.boolean('active').notNullable().defaultTo(true);
    table.bigInteger('erased_at');
    table.integer('revision').notNullable().defaultTo(1);
    table.bigInteger('created_at').notNullable();
    table.bigInteger('updated_at').notNullable();
    table.index(['shop_id', 'name_search', 'id']);
  });
  await uniqueWhere(knex, {
    name: 'people_phone_once_a_shop',
    table: 'people',
    columns: ['shop_id', 'phone'],
    where: 'phone is not null',
  });

  await knex.schema.createTable('person_roles', (table) => {
    shopRow(table);
    sameShop(table, 'person_id', 'people');
    table.text('role').notNullable();
    table.unique(['shop_id', 'person_id', 'role']);
    table.index(['shop_id', 'role']);
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['person_roles', 'people', 'shops']) await knex.schema.dropTable(table);
}
