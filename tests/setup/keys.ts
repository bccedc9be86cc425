import type { Page } from 'playwright-core';

/** Waits until the page answers to hands: its islands have woken and nothing is on its way. */
export async function settle(page: Page): Promise<void> {
  await page.waitForLoadState('networkidle');
  await page.waitForFunction(() => !document.querySelector('astro-island[ssr]'));
}

/** Tabs until the field with this id has the focus, as somebody without a mouse does. */
export async function tabTo(page: Page, id: string): Promise<void> {
  for (let presses = 0; presses < 60; presses += 1) {
    if (await page.evaluate((wanted) => document.activeElement?.id === wanted, id)) return;
    await page.keyboard.press('Tab');
  }
  throw new RangeError(`tabTo: ${id} was not reached`);
}

export async function typeInto(page: Page, id: string, text: string): Promise<void> {
  await tabTo(page, id);
  await page.keyboard.type(text);
}

/** Tabs into a group of radio buttons and picks one of them with the keys. */
export async function pick(page: Page, group: string, value: string): Promise<void> {
  for (let presses = 0; presses < 60; presses += 1) {
    const name = await page.evaluate((id) => {
      const active = document.activeElement;
      return active?.closest('fieldset')?.id === id;
    }, group);
    if (name) break;
    await page.keyboard.press('Tab');
  }
  await page.keyboard.press('Space');
  for (let presses = 0; presses < 15; presses += 1) {
    if (await page.evaluate((wanted) => (document.activeElement as HTMLInputElement).value === wanted, value))
      return;
    await page.keyboard.press('ArrowDown');
  }
  throw new RangeError(`pick: ${value} is not in ${group}`);
}

export async function nextByKey(page: Page, step: string): Promise<void> {
  for (let presses = 0; presses < 60; presses += 1) {
    const isNext = await page.evaluate(() => document.activeElement?.textContent === 'Next');
    if (isNext) break;
    await page.keyboard.press('Tab');
  }
  await page.keyboard.press('Enter');
  await page.waitForURL(`**/${step}`);
  await settle(page);
}
