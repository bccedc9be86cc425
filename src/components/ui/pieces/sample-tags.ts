import type { TagSetting } from '../JobTag.tsx';
import type { SettingMarkKind } from '../SettingMark.tsx';
import type { TagState } from '../tag-state.ts';

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
