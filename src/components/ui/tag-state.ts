import type { IconName } from './icon-shapes.ts';

/** How far a run is, as its tag shows it. The word comes from the page; the icon and the tone belong to the state. */
export type TagState =
  | 'planned'
  | 'next'
  | 'sent'
  | 'making'
  | 'made'
  | 'waiting'
  | 'askBack'
  | 'done'
  | 'skipped'
  | 'held';

export const tagStateIcons: Readonly<Record<TagState, IconName>> = {
  planned: 'planned',
  next: 'arrow-right',
  sent: 'send',
  making: 'gauge',
  made: 'batch',
  waiting: 'wait',
  askBack: 'question',
  done: 'tick',
  skipped: 'skip',
  held: 'pause',
};
