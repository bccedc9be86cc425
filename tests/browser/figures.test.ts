import { beforeAll, describe, expect, it } from 'vitest';
import { withAppInBrowser } from '../setup/app-in-browser.ts';
import { openPage, type WatchedPage } from '../setup/browser.ts';

const at = withAppInBrowser();
let opened: WatchedPage;
beforeAll(async () => {
  opened = await openPage(at.browser);
  await opened.page.goto(`${at.running.url}/pieces`, { waitUntil: 'load' });
});

interface Wish {
  words: readonly string[];
  family: string;
  weight: number;
}

/** The widths in px, at 100 px, of words set in one of the product's faces, once that face is there. */
function measure(wish: Wish): Promise<number[]> {
  return opened.page.evaluate(async ({ words, family, weight }) => {
    const face = `${weight} 100px ${family}`;
    await document.fonts.load(face, words.join(''));
    if (!document.fonts.check(face, words.join(''))) throw new Error(`${face} did not load`);
    const pen = document.createElement('canvas').getContext('2d');
    if (!pen) throw new Error('no canvas');
    pen.font = face;
    return words.map((word) => pen.measureText(word).width);
  }, wish);
}

describe.each([400, 600])('figures of weight %d', (weight) => {
  it('are equally wide, so that columns of them stand still', async () => {
    const [ones, eights] = await measure({ words: ['111.1', '888.8'], family: 'Figures', weight });
    expect(ones).toBeGreaterThan(100);
    expect(eights).toBe(ones);
  });

  it('are equally wide one by one, plus and minus too', async () => {
    const digits = await measure({ words: [...'0123456789'], family: 'Figures', weight });
    expect(new Set(digits).size).toBe(1);
    const [plus, minus] = await measure({ words: ['+', '−'], family: 'Figures', weight });
    expect(minus).toBe(plus);
  });

  it('would not be so in the face for words', async () => {
    const [ones, eights] = await measure({ words: ['111.1', '888.8'], family: 'Lexend', weight });
    expect(eights).not.toBe(ones);
  });

  it('are what tables and tags are set in', async () => {
    const [ones = 0, plainOnes = 0] = [
      ...(await measure({ words: ['111.1'], family: 'Figures', weight })),
      ...(await measure({ words: ['111.1'], family: 'Lexend', weight })),
    ];
    expect(plainOnes).not.toBe(ones);
    const families = await opened.page.evaluate(() =>
      ['.table-figures', '.job-tag-value', '.job-tag-number', '.track-value', '.input-number'].map(
        (selector) => {
          const element = document.querySelector(selector);
          return element ? getComputedStyle(element).fontFamily.split(',')[0] : `no ${selector}`;
        },
      ),
    );
    expect(new Set(families)).toEqual(new Set(['Figures']));
  });
});
