import type { Starter, StarterWords } from './starter.ts';

/** Too wet or too dry: drying on a belt or in an oven. */
export function drying(t: StarterWords): Starter {
  return {
    title: t('drying.title'),
    result: {
      name: t('drying.result'),
      unit: '%',
      wish: 'target',
      target: 8,
      kind: 'measured',
      usual: 9,
      lowest: 8.2,
      highest: 9.8,
      worth: 0.6,
      atLeast: 7.5,
      atMost: 8.5,
    },
    measuring: { who: 'operator', when: 'minutes', minutes: '20', partsPerRun: '3' },
    settings: [
      {
        id: 'air-temp',
        name: t('drying.airTemp'),
        unit: 'C',
        low: 60,
        high: 75,
        usual: 65,
        settleMinutes: 15,
        harderEnd: 'high',
      },
      { id: 'belt-speed', name: t('drying.beltSpeed'), unit: 'm/min', low: 0.8, high: 1.2, usual: 1 },
      { id: 'layer', name: t('drying.layer'), unit: 'mm', low: 20, high: 35, usual: 30 },
      { id: 'fan', name: t('drying.fan'), unit: '%', low: 60, high: 90, usual: 70 },
    ],
    hazards: ['hotParts', 'movingParts', 'dustOrFumes'],
    stop: ['smoke', 'jam', 'alarm', 'someoneHurt'],
    watch: { name: t('drying.watch'), wish: 'less', kind: 'rejects', lotSize: 100, usual: 6, atMost: 8 },
  };
}
