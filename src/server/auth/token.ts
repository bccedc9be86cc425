import { createHash, createHmac, randomBytes, timingSafeEqual } from 'node:crypto';
import { config } from '../env.ts';

const tokenBytes = 16;

/** 128 random bits for a link, in letters that survive any address bar. */
export function newToken(): string {
  return randomBytes(tokenBytes).toString('base64url');
}

/** What is stored of a token or a session id: it finds the row and cannot be turned back. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** A keyed hash for what must be recognised again but not be readable, such as the number of a person who was erased. */
export function keyedHash(purpose: string, text: string): string {
  return createHmac('sha256', config().secret).update(`${purpose}\n${text}`).digest('hex');
}

/** Compares two secrets in a time that does not tell how far they agree. */
export function sameSecret(a: string, b: string): boolean {
  const [left, right] = [Buffer.from(a), Buffer.from(b)];
  return left.length === right.length && timingSafeEqual(left, right);
}
