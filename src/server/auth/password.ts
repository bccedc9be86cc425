import { hash, verify } from '@node-rs/argon2';

// argon2id with the package's defaults (19 MiB, 2 passes, 1 lane): the smallest setting that OWASP's Password Storage
// Cheat Sheet recommends.

// One keyboard types an accented letter as one code, another as two: both are the same password (NIST SP 800-63B).
function normalize(password: string): string {
  return password.normalize('NFKC');
}

let decoy: Promise<string> | undefined;

/** Takes some 30 ms of another thread: never call it inside a transaction. */
export function hashPassword(password: string): Promise<string> {
  return hash(normalize(password));
}

/**
 * Checks a password. Without a stored hash (an unknown address) it checks against a decoy, so that the answer takes as
 * long and does not tell whether the address exists.
 */
export async function checkPassword(stored: string | null, password: string): Promise<boolean> {
  decoy ??= hash('no one has this password');
  const instead = await decoy;
  const matches = await verify(stored ?? instead, normalize(password));
  return stored !== null && matches;
}
