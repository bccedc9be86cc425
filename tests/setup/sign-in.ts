import type { Page } from 'playwright-core';
import { demoSignIns } from '../../src/server/demo-sign-ins.ts';

/** Signs the page's visitor in as one of the demo shop, by the form as a person would. */
export async function signIn(
  page: Page,
  url: string,
  role: (typeof demoSignIns)[number]['role'],
): Promise<void> {
  const person = demoSignIns.find((each) => each.role === role);
  if (!person) throw new RangeError('signIn: role has no demo sign-in');
  await page.goto(`${url}/sign-in`);
  await page.locator('input[name="email"]').first().fill(person.email);
  await page.locator('input[name="password"]').first().fill(person.password);
  await page.locator('input[name="password"]').first().press('Enter');
  await page.waitForURL((address) => address.pathname !== '/sign-in');
}
