import type { Starter, StarterWords } from './starter.ts';

/** Color that is off: printing on film, paper and board. */
export function printing(t: StarterWords): Starter {
  return {
    title: t('printing.title'),
    result: {
      name: t('printing.result'),
      unit: 'dE',
      wish: 'less',
      kind: 'measured',
      usual: 3.2,
      lowest: 2.6,
      highest: 3.8,
      worth: 0.5,
      atMost: 3,
    },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' },
    settings: [
      {
        id: 'speed',
        name: t('printing.speed'),
        unit: 'm/min',
        low: 80,
        high: 120,
        usual: 100,
        discardParts: 20,
        harderEnd: 'high',
      },
      {
        id: 'ink',
        name: t('printing.ink'),
        unit: 's',
        low: 18,
        high: 22,
        usual: 20,
        settleMinutes: 5,
        discardParts: 20,
      },
      {
        id: 'pressure',
        name: t('printing.pressure'),
        unit: 'bar',
        low: 3,
        high: 4,
        usual: 3.5,
        discardParts: 20,
      },
      {
        id: 'dryer',
        name: t('printing.dryer'),
        unit: 'C',
        low: 60,
        high: 80,
        usual: 70,
        settleMinutes: 10,
        discardParts: 20,
        harderEnd: 'high',
      },
    ],
    hazards: ['movingParts', 'chemicals', 'dustOrFumes'],
    stop: ['smoke', 'jam', 'leak', 'someoneHurt'],
    watch: { name: t('printing.watch'), wish: 'less', kind: 'rejects', lotSize: 50, usual: 5, atMost: 6 },
  };
}
