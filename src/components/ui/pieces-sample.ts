import type { TableColumn } from './Table.tsx';

/** Words and figures for the page that shows developers every piece. No reader of the product ever sees them. */
export const words = {
  title: 'Pieces',
  note: 'Every piece in every state, light and dark.',
  skip: 'Skip to the page',
  nav: {
    label: 'Main',
    items: [
      { href: '#trials', label: 'Trials', current: true },
      { href: '#people', label: 'People' },
      { href: '#shop', label: 'Shop' },
    ],
  },
  profile: 'Your profile',
  signOut: 'Sign out',
  back: 'Back',
  next: 'Next',
  more: 'More',
  save: 'Save',
  saving: 'Saving',
  print: 'Print',
  newTrial: 'New trial',
  hold: 'Hold for safety',
  call: 'Call Ana',
  resume: 'Resume',
  info: 'Three to five settings is a good start.',
  cautionTitle: 'Run 4: Ana wrote “jaw slow to heat” at 10:12.',
  caution: 'No more runs go out until you deal with it.',
  stopTitle: 'Stopped at 10:20.',
  stop: 'Ana got the text. Minh has not answered. Call him.',
  good: 'It held: about 6 N better than today’s settings.',
  machine: 'Machine',
  machineHelp: 'As the crew calls it.',
  mail: 'E-mail',
  mailError: 'Something is missing after the @. Type it like dana@example.com.',
  low: 'Low',
  high: 'High',
  highError: 'The low must be below the high.',
  caller: 'Whom to call',
  callers: [
    { value: 'dana', label: 'Dana, ext 12' },
    { value: 'lee', label: 'Lee, ext 14' },
  ],
  pick: 'Pick one',
  runs: 'Runs so far',
  openRuns: 'Open runs',
  noRuns: 'No run has gone out yet. The first goes to Ana at 09:00.',
  emptyTitle: 'No trials yet',
  empty: 'Start with what is wrong on a machine. It takes about ten minutes.',
} as const;

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
  { run: '2', machine: 'Line 3', jaw: '160', strength: '41.5' },
  { run: '3', machine: 'Line 3', jaw: '140', strength: '111.1' },
  { run: '4', machine: 'Line 3', jaw: '160', strength: '888.8' },
];
