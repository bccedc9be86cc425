import { writeFileSync } from 'node:fs';

/** Each table has a seed of its own, counted from here. */
export const SEED = 20_260_401;

/** Writes a table to tests/reports. */
export function report(name: string, title: string, about: string, table: string): void {
  const file = new URL(`../../reports/verdict-${name}.md`, import.meta.url);
  writeFileSync(file, `# ${title}\n\n${about}\n\n${table}\n`);
  console.log(`tests/reports/verdict-${name}.md`);
}
