import { describe, expect, it } from 'vitest';
import { compareUsage, findKeyUsage } from './key-usage.ts';
import { readLocales } from './locale-files.ts';
import { readSources } from './sources.ts';

const minutes = 60_000;

describe('every key is there and every key is used', { timeout: 2 * minutes }, () => {
  it('in the product', () => {
    expect(compareUsage(findKeyUsage(readSources()), readLocales().get('en') ?? new Map())).toEqual([]);
  });

  const text = `
    declare const t: (key: string, values?: object) => string;
    declare const state: 'held' | 'running';
    declare const anything: string;
    const entries = [{ key: 'shop:title' }, { key: 'shop:foot' }] as const;
    t('trial:title');
    t(\`trial:state.\${state}\`);
    t(state === 'held' ? 'trial:hold' : 'trial:go', { count: 3 });
    for (const { key } of entries) t(key);
    t(\`trial:\${anything}\`);
    function Word() { return <Trans i18nKey="trial:rich" />; }`;
  const usage = findKeyUsage([{ path: 'src/pages/planted.tsx', text }]);

  it('and keys are read from what their types allow', () => {
    expect([...usage.used].sort()).toEqual([
      'shop:foot',
      'shop:title',
      'trial:go',
      'trial:hold',
      'trial:rich',
      'trial:state.held',
      'trial:state.running',
      'trial:title',
    ]);
  });

  it('and a key that could be any text is reported', () => {
    expect(usage.unreadable).toHaveLength(1);
  });

  it('and Astro files are read', () => {
    const page = `---\nconst { t } = Astro.locals;\n---\n<p title={t('trial:name')}>{t('trial:words')}</p>`;
    const { used } = findKeyUsage([{ path: 'src/pages/planted.astro', text: page }]);
    expect([...used].sort()).toEqual(['trial:name', 'trial:words']);
  });

  it('and missing and unused keys are found', () => {
    const words = new Map([
      ['trial:runs_one', ''],
      ['trial:runs_other', ''],
      ['trial:old', ''],
    ]);
    expect(compareUsage({ used: new Set(['runs', 'trial:new']), unreadable: [] }, words)).toEqual([
      'trial:new is asked for and is not there',
      'trial:old is there and nobody asks for it',
    ]);
  });
});
