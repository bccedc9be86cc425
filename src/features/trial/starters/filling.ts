import type { Starter, StarterWords } from './starter.ts';

/** Packs that are too full or too light: filling by weight. */
export function filling(t: StarterWords): Starter {
  return {
    title: t('filling.title'),
    result: {
      name: t('filling.result'),
      unit: 'g',
      wish: 'target',
      target: 500,
      kind: 'measured',
      usual: 503,
      lowest: 499,
      highest: 507,
      worth: 2,
      atLeast: 498,
      atMost: 506,
    },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '5' },
    settings: [
      { id: 'speed', name: t('filling.speed'), unit: '%', low: 60, high: 80, usual: 70, discardParts: 5 },
      { id: 'temp', name: t('filling.temp'), unit: 'C', low: 18, high: 24, usual: 20, settleMinutes: 15 },
      { id: 'nozzle', name: t('filling.nozzle'), unit: 'mm', low: 10, high: 20, usual: 15, discardParts: 5 },
      {
        id: 'pressure',
        name: t('filling.pressure'),
        unit: 'bar',
        low: 0.8,
        high: 1.2,
        usual: 1,
        discardParts: 5,
        harderEnd: 'high',
      },
    ],
    hazards: ['movingParts', 'pressure'],
    stop: ['leak', 'jam', 'someoneHurt'],
    watch: { name: t('filling.watch'), wish: 'less', kind: 'rejects', lotSize: 50, usual: 5, atMost: 6 },
  };
}
