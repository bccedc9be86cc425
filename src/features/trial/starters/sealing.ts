import type { Starter, StarterWords } from './starter.ts';

/** Seals that open: heat seals on pouches, bags and trays. */
export function sealing(t: StarterWords): Starter {
  return {
    title: t('sealing.title'),
    result: {
      name: t('sealing.result'),
      unit: t('sealing.unit'),
      wish: 'more',
      kind: 'measured',
      usual: 35,
      lowest: 31,
      highest: 39,
      worth: 3,
      atLeast: 38,
    },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' },
    settings: [
      {
        id: 'jaw-temp',
        name: t('sealing.jawTemp'),
        panelName: t('sealing.panel.jawTemp'),
        unit: 'C',
        low: 140,
        high: 160,
        usual: 150,
        settleMinutes: 5,
        discardParts: 10,
        harderEnd: 'high',
      },
      {
        id: 'dwell',
        name: t('sealing.dwell'),
        panelName: t('sealing.panel.dwell'),
        unit: 's',
        low: 0.8,
        high: 1,
        usual: 0.8,
      },
      {
        id: 'pressure',
        name: t('sealing.pressure'),
        panelName: t('sealing.panel.pressure'),
        unit: 'bar',
        low: 3,
        high: 4,
        usual: 3,
        harderEnd: 'high',
      },
      {
        id: 'film',
        name: t('sealing.film'),
        panelName: t('sealing.panel.film'),
        either: [t('sealing.supplierA'), t('sealing.supplierB')],
      },
    ],
    hazards: ['hotParts', 'movingParts'],
    stop: ['smoke', 'jam', 'someoneHurt'],
    watch: {
      name: t('sealing.watch'),
      wish: 'less',
      kind: 'rejects',
      lotSize: 50,
      usual: 2,
      atMost: 3,
    },
  };
}
