import type { Starter, StarterWords } from './starter.ts';

/** A coat that is too thin, too thick or uneven: paint and lacquer by spray gun. */
export function coating(t: StarterWords): Starter {
  return {
    title: t('coating.title'),
    result: {
      name: t('coating.result'),
      unit: 'µm',
      wish: 'target',
      target: 60,
      kind: 'measured',
      usual: 52,
      lowest: 46,
      highest: 58,
      worth: 4,
      atLeast: 50,
      atMost: 70,
    },
    measuring: { who: 'operator', when: 'minutes', minutes: '30', partsPerRun: '3' },
    settings: [
      {
        id: 'spray-pressure',
        name: t('coating.sprayPressure'),
        unit: 'bar',
        low: 2,
        high: 3,
        usual: 2.5,
        harderEnd: 'high',
      },
      { id: 'distance', name: t('coating.distance'), unit: 'cm', low: 20, high: 30, usual: 25 },
      { id: 'line-speed', name: t('coating.lineSpeed'), unit: 'm/min', low: 2, high: 3, usual: 2.5 },
      { id: 'thinner', name: t('coating.thinner'), unit: '%', low: 5, high: 10, usual: 8, settleMinutes: 5 },
    ],
    hazards: ['chemicals', 'dustOrFumes', 'pressure'],
    stop: ['leak', 'alarm', 'someoneHurt'],
    watch: { name: t('coating.watch'), wish: 'less', kind: 'flaws', lotSize: 20, usual: 6 },
  };
}
