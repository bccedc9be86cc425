import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  // What a problem is decides whether runs wait for it.
  await knex.schema.alterTable('problems', (table) => {
    table.text('kind').notNullable().defaultTo('problem');
  });
  // Every end of a trial asks somebody to put the usual settings back; the board says so until it is done.
  await knex.schema.alterTable('trials', (table) => {
    table.bigInteger('set_back_asked_at');
    table.bigInteger('set_back_at');
  });
}

export async function down(knex: Knex): Promise<void> {
  for (const column of ['set_back_at', 'set_back_asked_at']) {
    await knex.raw('alter table ?? drop column ??', ['trials', column]);
  }
  await knex.raw('alter table ?? drop column ??', ['problems', 'kind']);
}
