// Writes two rows in one transaction, again and again, always with the same number in both; prints the last number when
// it is told to stop. Run beside a backup: a copy in which the two differ was not taken at one moment.
import Sqlite from 'better-sqlite3';

const db = new Sqlite(process.argv[2], { timeout: 10_000 });
const write = db.prepare(
  'INSERT INTO app_state (key, value) VALUES (?, ?) ON CONFLICT (key) DO UPDATE SET value = excluded.value',
);
const writePair = db.transaction((number) => {
  for (const key of ['pair.left', 'pair.right']) write.run(key, String(number));
});

let number = 0;
const timer = setInterval(() => {
  number += 1;
  writePair.immediate(number);
  if (number === 1) console.log('writing');
});
process.on('SIGTERM', () => {
  clearInterval(timer);
  console.log(`last ${number}`);
  // With `--leave-open` as if the machine had failed: what was written last is not yet in the main file.
  if (!process.argv.includes('--leave-open')) db.close();
  else process.kill(process.pid, 'SIGKILL');
});
