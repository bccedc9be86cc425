import type { Starter, StarterWords } from './starter.ts';

/** Loaves that sink: bread and cakes. */
export function baking(t: StarterWords): Starter {
  return {
    title: t('baking.title'),
    result: {
      name: t('baking.result'),
      unit: 'mm',
      wish: 'more',
      kind: 'measured',
      usual: 95,
      lowest: 90,
      highest: 100,
      worth: 4,
      atLeast: 92,
    },
    measuring: { who: 'operator', when: 'minutes', minutes: '60', partsPerRun: '4' },
    settings: [
      {
        id: 'oven-temp',
        name: t('baking.ovenTemp'),
        unit: 'C',
        low: 210,
        high: 230,
        usual: 220,
        settleMinutes: 20,
        harderEnd: 'high',
      },
      { id: 'bake-time', name: t('baking.bakeTime'), unit: 'min', low: 28, high: 34, usual: 30 },
      { id: 'proof-time', name: t('baking.proofTime'), unit: 'min', low: 45, high: 65, usual: 55 },
      { id: 'water', name: t('baking.water'), unit: '%', low: 60, high: 64, usual: 62 },
      { id: 'flour', name: t('baking.flour'), either: [t('baking.millA'), t('baking.millB')] },
    ],
    hazards: ['hotParts', 'lifting'],
    stop: ['smoke', 'alarm', 'someoneHurt'],
    watch: { name: t('baking.watch'), wish: 'more', kind: 'scored', usual: 6, atLeast: 5 },
  };
}
