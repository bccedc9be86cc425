import type { Language } from '../../i18n/languages.ts';
import type { ResultItem } from '../run/result-items.ts';
import type { HazardName, StopRule } from '../trial/answer-choices.ts';
import type { SettingMarkName } from '../trial/setting-mark.ts';

/** A run as its person sees it on the phone. */
export interface PhoneRun {
  id: string;
  number: number;
  state: 'asked' | 'made' | 'doubtful';
  revision: number;
  settings: { name: string; value: number | string; unit: string; mark: SettingMarkName }[];
  /** Minutes to wait and parts to throw away before parts count; 0: none. */
  waitMinutes: number;
  throwAway: number;
}

/** Everything a phone page says. */
export interface PhoneView {
  language: Language;
  personName: string;
  trialId: string;
  machine: string;
  shopNumber: string | null;
  runs: number;
  /** `over`: nothing is run any more. */
  state: 'running' | 'paused' | 'held' | 'over';
  /** What this person has to make or to measure now; null: nothing. */
  run: PhoneRun | null;
  items: ResultItem[];
  label: string;
  hazards: HazardName[];
  stopRules: StopRule[];
  ownStopRule: string;
  call: { when: string; whom: string }[];
  /** The run that was sent last, with its figures, so that they can be taken back. */
  last: { number: number; figures: string } | null;
}
