import type { Starter, StarterWords } from './starter.ts';

/** Parts that warp: injection moulding of plastics. */
export function moulding(t: StarterWords): Starter {
  return {
    title: t('moulding.title'),
    result: {
      name: t('moulding.result'),
      unit: 'mm',
      wish: 'less',
      kind: 'measured',
      usual: 0.8,
      lowest: 0.6,
      highest: 1,
      worth: 0.15,
      atMost: 0.7,
    },
    measuring: { who: 'operator', when: 'minutes', minutes: '15', partsPerRun: '3' },
    settings: [
      {
        id: 'melt-temp',
        name: t('moulding.meltTemp'),
        unit: 'C',
        low: 220,
        high: 240,
        usual: 230,
        settleMinutes: 10,
        discardParts: 10,
        harderEnd: 'high',
      },
      {
        id: 'hold-pressure',
        name: t('moulding.holdPressure'),
        unit: 'bar',
        low: 400,
        high: 500,
        usual: 450,
        discardParts: 5,
        harderEnd: 'high',
      },
      {
        id: 'cooling-time',
        name: t('moulding.coolingTime'),
        unit: 's',
        low: 12,
        high: 18,
        usual: 14,
        discardParts: 5,
      },
      {
        id: 'mould-temp',
        name: t('moulding.mouldTemp'),
        unit: 'C',
        low: 40,
        high: 60,
        usual: 50,
        settleMinutes: 15,
        discardParts: 10,
      },
    ],
    hazards: ['hotParts', 'movingParts', 'pressure'],
    stop: ['smoke', 'jam', 'leak', 'someoneHurt'],
    watch: { name: t('moulding.watch'), wish: 'less', kind: 'rejects', lotSize: 20, usual: 2, atMost: 3 },
  };
}
