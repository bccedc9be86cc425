import type { Starter, StarterWords } from './starter.ts';

/** Burrs and ragged edges: sawing and shearing. */
export function cutting(t: StarterWords): Starter {
  return {
    title: t('cutting.title'),
    result: {
      name: t('cutting.result'),
      unit: 'mm',
      wish: 'less',
      kind: 'measured',
      usual: 0.12,
      lowest: 0.08,
      highest: 0.16,
      worth: 0.03,
      atMost: 0.1,
    },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' },
    settings: [
      {
        id: 'blade-speed',
        name: t('cutting.bladeSpeed'),
        unit: 'm/min',
        low: 40,
        high: 60,
        usual: 50,
        harderEnd: 'high',
      },
      { id: 'feed', name: t('cutting.feed'), unit: 'mm/s', low: 30, high: 50, usual: 40, harderEnd: 'high' },
      { id: 'clamp', name: t('cutting.clamp'), unit: 'bar', low: 4, high: 6, usual: 5, harderEnd: 'high' },
      { id: 'blade', name: t('cutting.blade'), either: [t('cutting.fine'), t('cutting.coarse')] },
    ],
    hazards: ['movingParts', 'loudNoise'],
    stop: ['smoke', 'jam', 'oddSound', 'someoneHurt'],
    watch: { name: t('cutting.watch'), wish: 'less', kind: 'rejects', lotSize: 50, usual: 5, atMost: 6 },
  };
}
