import type { Page } from 'playwright-core';

/** What a person does on a page, whatever they do it with. Each of these counts as one action: a field filled, a tap, a choice. */
export interface Hands {
  /** How many actions there were so far. */
  readonly actions: number;
  /** Presses a button or follows a link. */
  press(selector: string): Promise<void>;
  /** Fills a field in. */
  type(selector: string, text: string): Promise<void>;
  /** Fills a time of day in. */
  time(selector: string, at: { hour: number; half: 'AM' | 'PM' }): Promise<void>;
  /** Ticks a box. */
  tick(selector: string): Promise<void>;
  /** Picks one of a group of radio buttons. */
  pick(group: string, value: string): Promise<void>;
  /** Picks one of a list by what stands there. */
  choose(selector: string, label: string): Promise<void>;
}

const mostPresses = 250;

/** Somebody without a mouse: tabs to a thing and uses the keys that a browser gives it. */
export function keysOn(page: Page): Hands {
  let actions = 0;
  async function tabTo(selector: string): Promise<void> {
    actions += 1;
    for (let presses = 0; presses < mostPresses; presses += 1) {
      const isThere = await page.evaluate((wanted) => document.activeElement?.matches(wanted), selector);
      if (isThere) return;
      await page.keyboard.press('Tab');
    }
    throw new RangeError(`keysOn: Tab never reached ${selector}`);
  }
  return {
    get actions() {
      return actions;
    },
    async press(selector) {
      await tabTo(selector);
      await page.keyboard.press('Enter');
    },
    async type(selector, text) {
      await tabTo(selector);
      await page.keyboard.type(text);
    },
    async time(selector, { hour, half }) {
      await tabTo(selector);
      await page.keyboard.type(`${String(hour).padStart(2, '0')}00${half}`);
    },
    async tick(selector) {
      await tabTo(selector);
      await page.keyboard.press('Space');
    },
    async pick(group, value) {
      await tabTo(`fieldset[id="${group}"] input`);
      await page.keyboard.press('Space');
      for (let presses = 0; presses < 15; presses += 1) {
        const isIt = await page.evaluate(
          (wanted) => (document.activeElement as HTMLInputElement).value === wanted,
          value,
        );
        if (isIt) return;
        await page.keyboard.press('ArrowDown');
      }
      throw new RangeError(`keysOn: ${value} is not in ${group}`);
    },
    async choose(selector, label) {
      await tabTo(selector);
      await page.keyboard.type(label);
    },
  };
}

/** Somebody with a finger on a phone. A box or radio button is tapped by its words, as it is too small for a thumb. */
export function fingerOn(page: Page): Hands {
  let actions = 0;
  const tap = async (selector: string) => {
    actions += 1;
    await page.locator(selector).first().tap();
  };
  const tapWords = async (input: string) => {
    actions += 1;
    await page.locator(input).first().locator('xpath=ancestor::label[1]').tap();
  };
  return {
    get actions() {
      return actions;
    },
    press: tap,
    async type(selector, text) {
      actions += 1;
      await page.locator(selector).first().fill(text);
    },
    async time(selector, { hour, half }) {
      actions += 1;
      const shown = String(half === 'PM' ? hour + 12 : hour).padStart(2, '0');
      await page.locator(selector).fill(`${shown}:00`);
    },
    tick: tapWords,
    pick: (group, value) => tapWords(`fieldset[id="${group}"] input[value="${value}"]`),
    async choose(selector, label) {
      actions += 1;
      await page.locator(selector).selectOption({ label });
    },
  };
}
