import type { Knex } from 'knex';
import { sameShop, shopRow, uniqueWhere } from '../src/server/db/schema-parts.ts';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('trials', (table) => {
    shopRow(table);
    table.integer('number').notNullable();
    table.text('title').notNullable();
    table.text('title_search').notNullable();
    table.text('machine').notNullable();
    table.text('machine_search').notNullable();
    sameShop(table, 'owner_id', 'people');
    table.text('phase').notNullable().defaultTo('main');
    table.text('state').notNullable().defaultTo('draft');
    table.text('outcome');
    table.integer('revision').notNullable().defaultTo(1);
    table.integer('board_revision').notNullable().defaultTo(1);
    sameShop(table, 'follows_trial_id', 'trials', 'optional');
    table.text('follow_reason');
    table.bigInteger('put_away_at');
    table.bigInteger('created_at').notNullable();
    table.bigInteger('updated_at').notNullable();
    table.unique(['shop_id', 'number']);
    table.index(['shop_id', 'put_away_at', 'state', 'updated_at', 'id']);
    table.index(['shop_id', 'machine_search']);
  });

  await knex.schema.createTable('plans', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.integer('n').notNullable();
    table.text('phase').notNullable();
    table.bigInteger('seed').notNullable();
    table.text('core_version').notNullable();
    table.text('brief').notNullable();
    table.text('proposal').notNullable();
    table.text('hash').notNullable();
    sameShop(table, 'chosen_by', 'people');
    table.bigInteger('created_at').notNullable();
    table.unique(['shop_id', 'trial_id', 'n']);
  });

  await knex.schema.createTable('stretches', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    table.integer('n').notNullable();
    table.text('kind').notNullable();
    table.text('words').notNullable();
    table.bigInteger('at').notNullable();
    table.unique(['shop_id', 'trial_id', 'n']);
  });

  await knex.schema.createTable('runs', (table) => {
    shopRow(table);
    sameShop(table, 'trial_id', 'trials');
    sameShop(table, 'plan_id', 'plans');
    table.integer('number').notNullable();
    table.integer('place').notNullable();
    table.integer('block').notNullable();
    table.integer('whole_plot');
    table.text('group_key').notNullable();
    table.boolean('center').notNullable();
    table.boolean('warm_up').notNullable().defaultTo(false);
    table.text('coded').notNullable();
    table.text('planned').notNullable();
    table.text('actual');
    table.text('state').notNullable();
    table.text('end');
    sameShop(table, 'person_id', 'people', 'optional');
    sameShop(table, 'measurer_id', 'people', 'optional');
    table.text('gauge');
    table.text('label');
    sameShop(table, 'stretch_id', 'stretches', 'optional');
    sameShop(table, 'repeats_run_id', 'runs', 'optional');
    table.bigInteger('remind_at');
    table.bigInteger('asked_at');
    table.bigInteger('made_at');
    table.bigInteger('measured_at');
    table.bigInteger('closed_at');
    table.integer('revision').notNullable().defaultTo(1);
    table.unique(['shop_id', 'trial_id', 'number']);
    table.index(['shop_id', 'state', 'remind_at']);
  });
  await uniqueWhere(knex, {
    name: 'runs_one_to_make_a_phone',
    table: 'runs',
    columns: ['shop_id', 'person_id'],
    where: "state = 'asked'",
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['runs', 'stretches', 'plans', 'trials']) await knex.schema.dropTable(table);
}
