import { createInterface } from 'node:readline/promises';
import { parseArgs } from 'node:util';
import type { InstalledShop } from '../features/shop/installation.repository.ts';
import { addShop, listShops, renewShopLink } from '../features/shop/installation.service.ts';
import { removeShop } from '../features/shop/remove-shop.service.ts';
import { closeDatabase, database } from '../server/db/connection.ts';

// `npm run shop -- add NAME`, `-- list`, `-- remove NAME`: shops come and go from the server's own terminal.

const usage = `Usage:
  npm run shop -- add NAME       announce a shop and print the link that sets it up (again: a new link)
  npm run shop -- list           name the shops of this installation
  npm run shop -- remove NAME    take a shop away with everything in it`;

class Refusal extends Error {}

function describe(shop: InstalledShop): string {
  const since = new Date(shop.createdAt).toISOString().slice(0, 10);
  const people = shop.people === 0 ? 'waits for its set-up' : `${shop.people} people`;
  return `${shop.name || '(no name yet)'}  ${people}, since ${since}  ${shop.id}`;
}

function findNamed(shops: InstalledShop[], nameOrId: string): InstalledShop | undefined {
  const named = shops.filter(({ id, name }) => id === nameOrId || name === nameOrId);
  if (named.length > 1)
    throw new Refusal(`Several shops have this name. Give the id:\n${named.map(describe).join('\n')}`);
  return named[0];
}

async function add(name: string): Promise<void> {
  const there = findNamed(await listShops(database()), name);
  const url = there ? await renewShopLink(database(), there) : await addShop(database(), name);
  if (url === null) throw new Refusal(`${name} is set up already. Its admin adds people.`);
  console.log(`Set up ${name} at\n${url}\nThe link works once, within 24 hours, and is not shown again.`);
}

async function list(): Promise<void> {
  const shops = await listShops(database());
  console.log(shops.length === 0 ? 'No shops yet.' : shops.map(describe).join('\n'));
}

async function remove(nameOrId: string): Promise<void> {
  const shop = findNamed(await listShops(database()), nameOrId);
  if (!shop) throw new Refusal(`No shop is called ${nameOrId}. See: npm run shop -- list`);
  const asked = shop.name || shop.id;
  console.log(
    `This takes away ${describe(shop)}\nwith its people, trials, readings and log. Only a backup has it then.`,
  );
  const terminal = createInterface({ input: process.stdin, output: process.stdout });
  const typed = await terminal.question('Type the name of the shop to go on: ');
  terminal.close();
  if (typed.trim() !== asked) throw new Refusal('That is another name. Nothing was removed.');
  await removeShop(database(), shop.id);
  console.log(`${asked} is gone.`);
}

async function run(): Promise<void> {
  const { positionals } = parseArgs({ allowPositionals: true });
  const [what, ...words] = positionals;
  const name = words.join(' ').trim();
  if (!(await database().schema.hasTable('shops'))) {
    throw new Refusal('There is no data here yet. Start Trywell once (npm run up), then try again.');
  }
  if (what === 'list') return list();
  if (what === 'add' && name) return add(name);
  if (what === 'remove' && name) return remove(name);
  throw new Refusal(usage);
}

try {
  await run();
} catch (error) {
  if (!(error instanceof Refusal)) throw error;
  console.error(error.message);
  process.exitCode = 1;
} finally {
  await closeDatabase();
}
