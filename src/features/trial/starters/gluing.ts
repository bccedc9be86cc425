import type { Starter, StarterWords } from './starter.ts';

/** Joints that come apart: gluing. */
export function gluing(t: StarterWords): Starter {
  return {
    title: t('gluing.title'),
    result: {
      name: t('gluing.result'),
      unit: 'N',
      wish: 'more',
      kind: 'measured',
      usual: 180,
      lowest: 160,
      highest: 200,
      worth: 15,
      atLeast: 150,
    },
    measuring: { who: 'operator', when: 'later', partsPerRun: '3' },
    settings: [
      { id: 'amount', name: t('gluing.amount'), unit: 'g', low: 0.8, high: 1.2, usual: 1 },
      { id: 'press-time', name: t('gluing.pressTime'), unit: 's', low: 20, high: 40, usual: 30 },
      { id: 'force', name: t('gluing.force'), unit: 'N', low: 300, high: 500, usual: 400, harderEnd: 'high' },
      { id: 'surface', name: t('gluing.surface'), either: [t('gluing.wiped'), t('gluing.sanded')] },
    ],
    hazards: ['chemicals', 'dustOrFumes', 'movingParts'],
    stop: ['leak', 'jam', 'someoneHurt'],
    watch: { name: t('gluing.watch'), wish: 'less', kind: 'rejects', lotSize: 20, usual: 2, atMost: 4 },
  };
}
