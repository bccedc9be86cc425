import type { ChoiceOption } from './Choice.tsx';
import type { EffectRow } from './EffectList.tsx';
import type { Hazard } from './HazardSign.tsx';
import type { TagSetting } from './JobTag.tsx';
import type { SettingMarkKind } from './SettingMark.tsx';
import type { Step } from './Stepper.tsx';
import type { TableColumn } from './Table.tsx';
import type { TagState } from './tag-state.ts';

/** Words and figures for the page that shows developers every piece. No reader of the product ever sees them. */
export const words = {
  title: 'Pieces',
  note: 'Every piece in every state, light and dark.',
  skip: 'Skip to the page',
  trial: 'Line 3 seals',
  saved: 'Saved 08:41',
  foot: 'A text may come late. Machine stops, guards and local alarms come first.',
  nav: {
    label: 'Main',
    items: [
      { href: '#trials', label: 'Trials', current: true },
      { href: '#people', label: 'People' },
      { href: '#shop', label: 'Shop' },
    ],
  },
  heads: {
    type: 'Type and color',
    buttons: 'Buttons',
    callouts: 'Callouts',
    fields: 'Fields',
    choices: 'Choices',
    marks: 'Level and choice marks',
    tracks: 'Setting tracks',
    effects: 'Effect tracks',
    tags: 'Job tags',
    smallTags: 'Small tags',
    tables: 'Tables, tabs, pager',
    empty: 'Empty state',
    moving: 'Dialog and toast',
    icons: 'Icons and hazards',
    print: 'Print',
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
  optional: '(may be left out)',
  remark: 'Remark',
  caller: 'Whom to call',
  callers: [
    { value: 'dana', label: 'Dana, ext 12' },
    { value: 'lee', label: 'Lee, ext 14' },
  ],
  pick: 'Pick one',
  locked: 'Fixed since the start',
  want: 'I want it',
  know: 'How do you know?',
  parts: 'What happens to the parts?',
  partsError: 'Pick what happens to the parts.',
  hurt: 'What can hurt someone?',
  guards: 'Guards are on and work.',
  guardsHelp: 'Look at each one yourself.',
  noCrew: 'The crew knows that they may say no.',
  noCrewError: 'Tick this before you start.',
  panel: 'on the panel: JAW TEMP',
  quiet: 'Filled by level: low empty, middle half, high full.',
  openRuns: 'Open runs',
  runs: 'Runs so far',
  noRuns: 'No run has gone out yet. The first goes to Ana at 09:00.',
  emptyTitle: 'No trials yet',
  empty: 'Start with what is wrong on a machine. It takes about ten minutes.',
  stepsLabel: 'Questions',
  worse: 'worse',
  better: 'better, N',
  notWorth: 'not worth having',
  tabs: [
    { href: '#board', label: 'Board', current: true },
    { href: '#verdict', label: 'Verdict' },
    { href: '#audit', label: 'Audit' },
  ],
  tabsLabel: 'This trial',
  pagerLabel: 'Pages',
  pagerStatus: '21 to 40 of 63',
  previous: 'Earlier',
  later: 'Later',
  openDialog: 'Hand over run 4',
  dialogTitle: 'Hand over run 4',
  dialogWords: 'Both get a text. Ana can stop where she is.',
  to: 'To',
  close: 'Close',
  handOver: 'Hand over',
  openConfirm: 'End the trial early',
  confirmTitle: 'End with 4 of 11 runs?',
  confirmWords: 'Four runs can tell very little. You can open it again with a reason.',
  confirm: 'End it',
  ending: 'Ending',
  keep: 'Keep it running',
  toastGood: 'Show a saved toast',
  toastCaution: 'Show a caution toast',
  toasts: 'News',
  savedToast: 'Run 4 saved: 41.5, 40.8, 42.0 N.',
  lateToast: 'Ana has not got the text yet.',
  moreSettings: 'and 2 more',
  lockout: 'Job tag. Not a lockout tag.',
  cardNote: 'Set on 12 March, trial 7.',
  cardParts: [
    { title: 'Go back to', words: 'JAW TEMP 150, DWELL 0.8 if a pouch is under 38 N, or edges burn.' },
    { title: 'Whom to call', words: 'Dana, ext 12 by day. Lee, ext 14 at night.' },
  ],
  cardFoot: 'Hot jaws: guard closed. Local rules and the manual come first.',
  spinning: 'Saving the run',
} as const;

export const steps: readonly Step[] = [
  { key: 'problem', number: '1', label: 'Problem', state: 'done', stateWord: 'done', href: '#1' },
  { key: 'today', number: '2', label: 'Today', state: 'gap', stateWord: 'answers missing', href: '#2' },
  { key: 'settings', number: '3', label: 'Settings', state: 'current', href: '#3' },
  { key: 'safety', number: '4', label: 'Safety', state: 'open', href: '#4' },
  { key: 'way', number: '5', label: 'In the way', state: 'open' },
  { key: 'plan', number: '6', label: 'Plan', state: 'open' },
  { key: 'crew', number: '7', label: 'Crew', state: 'open' },
  { key: 'start', number: '8', label: 'Start', state: 'open' },
];

export const wants: readonly ChoiceOption[] = [
  { value: 'higher', label: 'higher' },
  { value: 'lower', label: 'lower' },
  { value: 'target', label: 'close to one value' },
  { value: 'none', label: 'not yet', disabled: true },
];

export const ways: readonly ChoiceOption[] = [
  { value: 'measured', label: 'We measure it', help: 'A gauge gives a number.' },
  { value: 'scored', label: 'We score it by eye', help: 'From 0 to 10, by one person.' },
  { value: 'rejects', label: 'We count bad ones out of a lot', help: 'Needs many parts a run.' },
];

export const fates: readonly ChoiceOption[] = [
  { value: 'throw', label: 'Throw away' },
  { value: 'hold', label: 'Mark, hold and check' },
  { value: 'use', label: 'Use if they pass' },
];

export const hazards: readonly { readonly value: Hazard; readonly label: string }[] = [
  { value: 'hot', label: 'Hot parts' },
  { value: 'pressure', label: 'Pressure' },
  { value: 'moving', label: 'Moving parts' },
  { value: 'chemicals', label: 'Chemicals' },
  { value: 'electricity', label: 'Electricity' },
  { value: 'dust', label: 'Dust or fumes' },
  { value: 'lifting', label: 'Lifting' },
  { value: 'noise', label: 'Loud noise' },
  { value: 'other', label: 'Something else' },
];

function settingsOf(marks: readonly [SettingMarkKind, SettingMarkKind, SettingMarkKind, 'first' | 'second']) {
  const [jaw, dwell, press, film] = marks;
  const jawValues: Partial<Record<SettingMarkKind, string>> = { low: '140', middle: '150', high: '160' };
  const dwellValues: Partial<Record<SettingMarkKind, string>> = { low: '0.8', middle: '0.9', high: '1.0' };
  const pressValues: Partial<Record<SettingMarkKind, string>> = { low: '3.0', middle: '3.5', high: '4.0' };
  const settings: readonly TagSetting[] = [
    { name: 'JAW TEMP', value: jawValues[jaw] ?? '', mark: jaw },
    { name: 'DWELL', value: dwellValues[dwell] ?? '', mark: dwell },
    { name: 'PRESS', value: pressValues[press] ?? '', mark: press },
    { name: 'FILM', value: film === 'first' ? 'A' : 'B', mark: film },
  ];
  return settings;
}

interface SampleTag {
  readonly number: string;
  readonly name: string;
  readonly state: TagState;
  readonly stateWord: string;
  readonly settings: readonly TagSetting[];
  readonly foot?: string;
  readonly current?: boolean;
}

export const tags: readonly SampleTag[] = [
  {
    state: 'done',
    stateWord: 'done',
    foot: '36.1  36.8  35.9 N',
    settings: settingsOf(['middle', 'middle', 'middle', 'first']),
  },
  {
    state: 'done',
    stateWord: 'done',
    foot: '41.5  40.8  42.0 N',
    settings: settingsOf(['high', 'low', 'low', 'first']),
  },
  {
    state: 'waiting',
    stateWord: 'waits for lab',
    foot: 'due tomorrow',
    settings: settingsOf(['low', 'high', 'low', 'second']),
  },
  {
    state: 'making',
    stateWord: 'making',
    foot: 'Ana, since 10:02',
    current: true,
    settings: settingsOf(['high', 'high', 'high', 'second']),
  },
  {
    state: 'askBack',
    stateWord: 'asking back',
    foot: '4.15 N, really?',
    settings: settingsOf(['high', 'low', 'high', 'second']),
  },
  {
    state: 'sent',
    stateWord: 'sent',
    foot: 'Minh, 10:20',
    settings: settingsOf(['low', 'low', 'high', 'first']),
  },
  {
    state: 'made',
    stateWord: 'made',
    foot: 'Minh, 10:31',
    settings: settingsOf(['low', 'high', 'high', 'first']),
  },
  {
    state: 'next',
    stateWord: 'next',
    foot: 'Ana',
    settings: settingsOf(['middle', 'middle', 'middle', 'second']),
  },
  { state: 'skipped', stateWord: 'skipped', settings: settingsOf(['low', 'low', 'low', 'second']) },
  { state: 'held', stateWord: 'held', settings: settingsOf(['high', 'high', 'low', 'first']) },
  { state: 'planned', stateWord: 'planned', settings: settingsOf(['high', 'low', 'high', 'first']) },
].map((tag, place) => ({ number: String(place + 1), name: `Run ${place + 1}`, ...tag }) as SampleTag);

export const longSettings: readonly TagSetting[] = [
  { name: 'STREFA GRZANIA 2 (TYŁ)', value: '1,250', unit: '°C', mark: 'high' },
  { name: 'DWELL', value: '0.85', unit: 's', mark: 'middle' },
  { name: 'PRESS', value: '-3.5', unit: 'bar', mark: 'low' },
  { name: 'FILM', value: 'Nhà cung cấp Đức Thịnh', mark: 'second' },
  { name: 'FEED', value: '12', unit: 'm/min', mark: 'high' },
  { name: 'COOLING', value: 'on', mark: 'first' },
  { name: 'LINE SPEED', value: '60', mark: 'low' },
];

export const smallTags = tags.slice(0, 5).map((tag) => ({
  number: tag.number,
  name: `${tag.name}: ${tag.settings.map((setting) => `${setting.name} ${setting.value}`).join(', ')}`,
  settings: tag.settings.flatMap(({ name, mark }) => (mark ? [{ name, mark }] : [])),
}));

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

export const swatches = [
  'ink',
  'steel',
  'edge',
  'line',
  'bench',
  'card',
  'bar',
  'petrol',
  'petrol-back',
  'good',
  'good-back',
  'caution',
  'caution-back',
  'stop',
  'stop-back',
] as const;
