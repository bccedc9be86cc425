import type { Answers } from '../../src/features/trial/answers.schema.ts';

// Invented, like the firm: what the supervisor of line 3 typed into the wizard.

const safety: Answers = {
  hazards: {
    ticked: [
      { hazard: 'hotParts', cautions: ['guardsClosed', 'heatGloves'], protects: 'Guard over the jaws' },
      { hazard: 'movingParts', cautions: ['guardsClosed', 'emergencyStopTested'] },
    ],
  },
  stop: { picked: ['smoke', 'jam', 'someoneHurt'] },
  call: {
    lines: [
      { id: 'day', when: 'day', whom: 'Dana, ext 12' },
      { id: 'night', when: 'night', whom: 'Lee, ext 14' },
    ],
  },
  neverRun: { mixes: [] },
  parts: { fate: 'hold', label: 'HOLD' },
  around: {
    batch: { way: 'same' },
    shift: { way: 'same' },
    machine: { way: 'same' },
    gauge: { way: 'same' },
    room: { way: 'writeDown' },
    crew: { way: 'writeDown' },
  },
};

const jawTemp = {
  id: 'jawTemp',
  kind: 'number',
  name: 'Jaw temp',
  panelName: 'JAW TEMP',
  unit: '°C',
  low: '140',
  high: '160',
  usual: '150',
  step: '1',
  min: '120',
  max: '180',
  settleMinutes: '5',
  discardParts: '10',
  harderEnd: 'high',
} as const;
const dwell = {
  id: 'dwell',
  kind: 'number',
  name: 'Dwell',
  panelName: 'DWELL',
  unit: 's',
  low: '0.7',
  high: '0.9',
  usual: '0.8',
  step: '0.05',
  harderEnd: 'high',
} as const;
const pressure = {
  id: 'pressure',
  kind: 'number',
  name: 'Jaw pressure',
  panelName: 'PRESS',
  unit: 'bar',
  low: '2.5',
  high: '3.5',
  usual: '3',
  step: '0.1',
  harderEnd: 'high',
} as const;
const film = {
  id: 'film',
  kind: 'choice',
  name: 'Film',
  panelName: 'FILM',
  low: 'Supplier A',
  high: 'Supplier B',
  usual: 'low',
} as const;

/** Line 3's seals open: the trial that shows how one ends. */
export const weakSeals: Answers = {
  ...safety,
  job: { starter: 'sealing', title: 'Stronger seals', machine: 'Line 3' },
  result: { name: 'seal strength', unit: 'N per 15 mm', wish: 'more', kind: 'measured' },
  measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' },
  usual: { usual: '35', lowest: '31', highest: '39' },
  worth: { change: '4' },
  limit: { atLeast: '38', limitFor: 'mean' },
  watch: {
    results: [
      {
        id: 'burnt',
        name: 'burnt edges',
        wish: 'less',
        kind: 'rejects',
        lotSize: '50',
        usual: '2',
        noLimit: true,
      },
    ],
  },
  value: { partsPerWeek: '60000', costOfBadPart: '0.4' },
  settings: { settings: [jawTemp, dwell, pressure, film] },
  spare: { runs: '12', hours: '6', moneyOpen: true, minutesPerRun: '15' },
  pace: { next: 'made' },
};

/** The same line a week later: a smaller question, half answered. */
export const leanerSeals: Answers = {
  ...safety,
  job: { starter: 'sealing', title: 'Less film scrap', machine: 'Line 3' },
  result: { name: 'scrap a reel', unit: 'm', wish: 'less', kind: 'measured' },
  measuring: { who: 'operator', when: 'atOnce', partsPerRun: '1' },
  usual: { usual: '14', lowest: '12', highest: '16' },
  worth: { change: '3' },
  limit: { noLimit: true },
  settings: { settings: [{ ...dwell, low: '0.75', high: '0.85' }, pressure, film] },
  spare: { runs: '12', hours: '6', moneyOpen: true, minutesPerRun: '20' },
  pace: { next: 'made' },
};

/** A question that has only just been begun. */
export const cloudySoup: Answers = {
  job: { starter: 'mixing', title: 'Smoother soup', machine: 'Kettle 2' },
  result: { name: 'lumps in a ladle', wish: 'less', kind: 'flaws', lotSize: '1' },
};
