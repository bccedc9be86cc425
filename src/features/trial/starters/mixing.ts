import type { Starter, StarterWords } from './starter.ts';

/** A mix that is not even: doughs, pastes, powders and liquids. */
export function mixing(t: StarterWords): Starter {
  return {
    title: t('mixing.title'),
    result: {
      name: t('mixing.result'),
      wish: 'more',
      kind: 'scored',
      usual: 6,
      lowest: 5,
      highest: 7,
      worth: 1.5,
      atLeast: 6,
    },
    measuring: { who: 'other', when: 'atOnce', partsPerRun: '3' },
    settings: [
      { id: 'mix-time', name: t('mixing.mixTime'), unit: 'min', low: 8, high: 12, usual: 10 },
      { id: 'speed', name: t('mixing.speed'), unit: 'rpm', low: 60, high: 90, usual: 75, harderEnd: 'high' },
      { id: 'temp', name: t('mixing.temp'), unit: 'C', low: 25, high: 35, usual: 30, settleMinutes: 10 },
      { id: 'order', name: t('mixing.order'), either: [t('mixing.powderFirst'), t('mixing.liquidFirst')] },
    ],
    hazards: ['movingParts', 'dustOrFumes', 'chemicals'],
    stop: ['oddSound', 'leak', 'alarm', 'someoneHurt'],
    watch: { name: t('mixing.watch'), wish: 'less', kind: 'scored', usual: 4, atMost: 5 },
  };
}
