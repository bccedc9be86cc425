import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.schema.createTable('worker_leases', (table) => {
    table.text('name').primary();
    table.text('holder').notNullable();
    table.bigInteger('until').notNullable();
    table.bigInteger('beat_at').notNullable();
  });

  await knex.schema.createTable('app_state', (table) => {
    table.text('key').primary();
    table.text('value').notNullable();
  });

  // The columns are those that rate-limiter-flexible reads and writes.
  await knex.schema.createTable('rate_limits', (table) => {
    table.string('key', 255).primary();
    table.integer('points').notNullable().defaultTo(0);
    table.bigInteger('expire');
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['rate_limits', 'app_state', 'worker_leases']) await knex.schema.dropTable(table);
}
