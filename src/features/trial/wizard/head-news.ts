import type { StepStates } from './step-states.ts';
import type { SaveState } from './stored-answers.ts';

/** What the page's own island tells the two small ones in the head. */
export interface HeadNews {
  save: SaveState;
  steps: StepStates;
}

// Only ever written in a browser, from an effect: on the server it stays empty for everybody.
let news: HeadNews | null = null;
const readers = new Set<() => void>();

/** Nothing new is no news: the head is not drawn again for each key. */
export function tellHead(next: HeadNews): void {
  if (JSON.stringify(news) === JSON.stringify(next)) return;
  news = next;
  for (const read of readers) read();
}

export function readHeadNews(): HeadNews | null {
  return news;
}

export function subscribeHeadNews(read: () => void): () => void {
  readers.add(read);
  return () => readers.delete(read);
}
