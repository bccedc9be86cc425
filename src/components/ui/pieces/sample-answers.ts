import type { ChoiceOption } from '../Choice.tsx';
import type { Hazard } from '../HazardSign.tsx';
import type { Step } from '../Stepper.tsx';

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
