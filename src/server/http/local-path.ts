import { config } from '../env.ts';

/** The page to go on to after a form, when it is one of ours; else the front page. Nobody is sent to another site. */
export function localPath(wish: unknown): string {
  if (typeof wish !== 'string' || !wish.startsWith('/')) return '/';
  const base = config().appUrl;
  try {
    const target = new URL(wish, base);
    return target.origin === new URL(base).origin ? `${target.pathname}${target.search}` : '/';
  } catch {
    return '/';
  }
}
