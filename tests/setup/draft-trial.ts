import type { Page } from 'playwright-core';
import { v7 } from 'uuid';

/** Adds a blank draft as whoever is signed in on the page, and answers its id. */
export async function addDraft(page: Page, url: string): Promise<string> {
  const id = v7();
  const answer = await page.request.put(`${url}/api/trials/${id}`, {
    data: {},
    headers: { Origin: new URL(url).origin },
  });
  if (!answer.ok()) throw new RangeError(`addDraft: the server answered ${answer.status()}`);
  return id;
}
