import { describe, expect, it } from 'vitest';
import { readSources } from './sources.ts';
import { findStrayWords } from './stray-words.ts';

function find(path: string, text: string) {
  return findStrayWords([{ path, text }]);
}

describe('every word a person reads is in locales/', () => {
  it('in the whole product', () => {
    expect(findStrayWords(readSources())).toEqual([]);
  });

  it.each([
    `<p>Save it</p>`,
    `<p>Save</p>`,
    `<b>{count} runs</b>`,
    `<input placeholder="Name" />`,
    `<img alt={'Jaw'} />`,
    `<Button label={isBusy ? 'Please wait' : word} />`,
    `<p>{\`Run \${n} is next.\`}</p>`,
  ])('and a word in markup is found: %s', (markup) => {
    expect(find('src/features/trial/Board.tsx', `const a = ${markup};`)).toHaveLength(1);
    expect(find('src/pages/board.astro', `---\n---\n${markup}`)).toHaveLength(1);
  });

  it.each([
    `const problem = 'The low must be below the high';`,
    `const problem = "this is not a number.";`,
    `const column = { key: 'run', label: 'Run' };`,
    `const words = \`Set \${name} to the usual value\`;`,
  ])('and a sentence in the code is found: %s', (text) => {
    expect(find('src/features/trial/trial.ts', text)).toHaveLength(1);
  });

  it.each([
    `import { Board } from './The Board.tsx';`,
    `throw new RangeError('stateAfter: event is not one of the table');`,
    `throw new RangeError(\`stateAfter: The event \${event} is unknown to all.\`);`,
    `log.warn({ event: 'late' }, 'The worker is late.');`,
    `const markup = <p class="flex gap-2 text-lg">{t('trial:title')}</p>;`,
    `const markup = <span translate="no">Trywell</span>;`,
    `const kind: 'not now' | 'keep today' = 'not now';`,
    `const type = 'Content-Type';`,
    `const cookie = 'Max-Age=0; Path=/; HttpOnly';`,
    `const letter = <td>{'A'}</td>;`,
    `const mark = <p>· 12 %</p>;`,
    `const setting = { name: 'JAW TEMP' };`,
  ])('and what is no sentence for readers is let be: %s', (text) => {
    expect(find('src/features/trial/Board.tsx', text)).toEqual([]);
  });

  it('and pages for developers, tests and the statistics core are let be', () => {
    for (const path of ['src/pages/pieces.astro', 'src/features/trial/Board.test.tsx', 'src/lib/doe/fit.ts'])
      expect(find(path, path.endsWith('.astro') ? '<p>Save it</p>' : `const a = 'Save it now.';`)).toEqual(
        [],
      );
  });
});
