import type { EffectRow } from '../EffectList.tsx';
import type { TableColumn } from '../Table.tsx';

export const effects: readonly EffectRow[] = [
  {
    key: 'jaw',
    name: 'Jaw temp 140 to 160',
    change: 6,
    from: 4,
    to: 8,
    size: '6 N stronger, 4 to 8',
    call: 'Matters. Clear.',
  },
  {
    key: 'dwell',
    name: 'Dwell 0.8 to 1.0',
    change: 3.2,
    from: 0.5,
    to: 5.9,
    size: '3.2 N stronger, 0.5 to 5.9',
    call: 'Matters, size open. Likely.',
  },
  {
    key: 'film',
    name: 'Film A or B',
    change: 1.4,
    from: -1.6,
    to: 4.4,
    size: 'B 1.4 N stronger, −1.6 to 4.4',
    call: 'Can’t tell yet.',
  },
  {
    key: 'press',
    name: 'Press 3 to 4',
    change: -0.2,
    from: -2,
    to: 1.6,
    size: '0.2 N weaker, −2.0 to 1.6',
    call: 'Makes no real difference between 3 and 4 bar.',
  },
];

export interface SampleRow {
  readonly run: string;
  readonly machine: string;
  readonly jaw: string;
  readonly strength: string;
}

export const sampleColumns: readonly TableColumn<SampleRow>[] = [
  { key: 'run', header: 'Run', cell: (row) => row.run, rowHeader: true, sortHref: '#run' },
  { key: 'machine', header: 'Machine', cell: (row) => row.machine },
  { key: 'jaw', header: 'Jaw temp, °C', cell: (row) => row.jaw, figures: true, sortHref: '#jaw' },
  {
    key: 'strength',
    header: 'Strength, N',
    cell: (row) => row.strength,
    figures: true,
    sortHref: '#strength',
  },
];

export const sampleRows: readonly SampleRow[] = [
  { run: '1', machine: 'Line 3', jaw: '150', strength: '36.1' },
  { run: '2', machine: 'Line 3', jaw: '160', strength: '−41.5' },
  { run: '3', machine: 'Line 3', jaw: '140', strength: '111.1' },
  { run: '4', machine: 'Line 3', jaw: '160', strength: '888.8' },
];
