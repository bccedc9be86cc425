import type { Starter, StarterWords } from './starter.ts';

/** A surface that is too rough: turning and milling. */
export function machining(t: StarterWords): Starter {
  return {
    title: t('machining.title'),
    result: {
      name: t('machining.result'),
      unit: 'µm Ra',
      wish: 'less',
      kind: 'measured',
      usual: 1.8,
      lowest: 1.5,
      highest: 2.1,
      worth: 0.3,
      atMost: 1.6,
    },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '2' },
    settings: [
      {
        id: 'speed',
        name: t('machining.speed'),
        unit: 'rpm',
        low: 1200,
        high: 1800,
        usual: 1500,
        harderEnd: 'high',
      },
      {
        id: 'feed',
        name: t('machining.feed'),
        unit: 'mm',
        low: 0.1,
        high: 0.2,
        usual: 0.15,
        harderEnd: 'high',
      },
      {
        id: 'depth',
        name: t('machining.depth'),
        unit: 'mm',
        low: 0.5,
        high: 1,
        usual: 0.8,
        harderEnd: 'high',
      },
      { id: 'tool', name: t('machining.tool'), either: [t('machining.toolA'), t('machining.toolB')] },
    ],
    hazards: ['movingParts', 'loudNoise'],
    stop: ['smoke', 'oddSound', 'alarm', 'someoneHurt'],
    watch: { name: t('machining.watch'), wish: 'less', kind: 'rejects', lotSize: 20, usual: 2, atMost: 3 },
  };
}
