import type { Starter, StarterWords } from './starter.ts';

/** Bad joints on boards: wave soldering. */
export function soldering(t: StarterWords): Starter {
  return {
    title: t('soldering.title'),
    result: {
      name: t('soldering.result'),
      wish: 'less',
      kind: 'flaws',
      lotSize: 10,
      usual: 14,
      lowest: 9,
      highest: 19,
      worth: 6,
    },
    measuring: { who: 'operator', when: 'atOnce' },
    settings: [
      {
        id: 'solder-temp',
        name: t('soldering.solderTemp'),
        unit: 'C',
        low: 250,
        high: 265,
        usual: 255,
        settleMinutes: 15,
        harderEnd: 'high',
      },
      { id: 'belt-speed', name: t('soldering.beltSpeed'), unit: 'm/min', low: 1, high: 1.4, usual: 1.2 },
      {
        id: 'preheat',
        name: t('soldering.preheat'),
        unit: 'C',
        low: 90,
        high: 120,
        usual: 105,
        settleMinutes: 10,
        harderEnd: 'high',
      },
      { id: 'flux', name: t('soldering.flux'), unit: '%', low: 60, high: 90, usual: 75 },
    ],
    hazards: ['hotParts', 'dustOrFumes', 'chemicals'],
    stop: ['smoke', 'leak', 'alarm', 'someoneHurt'],
    watch: { name: t('soldering.watch'), wish: 'less', kind: 'scored', usual: 4, atMost: 6 },
  };
}
