import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { findAccessFaults, openPage, takeShot } from '../setup/browser.ts';

const at = withAppInBrowser();

/** Width and height in mm of each page of a PDF as Chromium writes it. */
async function printPages(page: Page, format: 'A4' | 'Letter'): Promise<[number, number][]> {
  const pdf = (await page.pdf({ format, preferCSSPageSize: true, tagged: true })).toString('latin1');
  const boxes = pdf.matchAll(/\/Type \/Page\n[\s\S]*?\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/g);
  return Array.from(boxes, ([, width, height]) => [
    Math.round(Number(width) * (25.4 / 72)),
    Math.round(Number(height) * (25.4 / 72)),
  ]);
}

describe('the paper', () => {
  it.each([
    ['A4', [210, 297]],
    ['Letter', [216, 279]],
  ] as const)('takes six tags on a page of %s, then the card on A5', async (format, size) => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces/paper`);
    expect(await page.locator('.print-cell').count()).toBe(12);
    expect(await printPages(page, format)).toEqual([size, size, [148, 210]]);
    await close();
  });

  it('has setting values of 24 pt and keeps every tag inside its cut marks', async () => {
    const { page, complaints, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces/paper`);
    await page.emulateMedia({ media: 'print' });
    const sizes = await page
      .locator('.print-cell .job-tag-value:not(.job-tag-choice)')
      .evaluateAll((values) => values.map((value) => getComputedStyle(value).fontSize));
    expect(new Set(sizes)).toEqual(new Set(['32px']));
    const overfull = await page
      .locator('.print-cell .job-tag')
      .evaluateAll((tags) => tags.filter((tag) => tag.scrollHeight > tag.clientHeight + 1).length);
    expect(overfull).toBe(0);
    expect(await page.getByText('Job tag. Not a lockout tag.').count()).toBe(12);
    expect(complaints).toEqual([]);
    await close();
  });

  it('has no access fault on the screen before it is printed', async () => {
    const { page, close } = await openPage(at.browser);
    await page.goto(`${at.running.url}/pieces/paper`);
    expect(await findAccessFaults(page)).toEqual([]);
    await takeShot(page, 'pieces-paper');
    await close();
  });
});
