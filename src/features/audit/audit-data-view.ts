import type { MessageState } from '../message/message.ts';
import type { Reading, Run } from '../run/run.ts';
import type { stretchKinds } from '../run/stretch.ts';
import type { AuditFactor } from './audit-view.ts';

export interface AuditText {
  kind: 'text' | 'reply' | 'note';
  at: number;
  /** null where this reader may not see names. */
  who: string | null;
  words: string;
  state: MessageState | null;
}

export interface AuditRun extends Run {
  phase: 'main' | 'check';
  /** Of the stretch it was made in; null: not known. */
  stretch: number | null;
  maker: string | null;
  measurer: string | null;
  texts: AuditText[];
}

export interface AuditReading extends Reading {
  runNumber: number;
  resultName: string;
  unit: string;
  enteredByName: string | null;
}

export interface AuditDataView {
  factors: AuditFactor[];
  runs: AuditRun[];
  readings: AuditReading[];
  stretches: { n: number; kind: (typeof stretchKinds)[number]; words: string; at: number }[];
  /** Whether this reader may see who made, measured and entered. */
  showsNames: boolean;
}
