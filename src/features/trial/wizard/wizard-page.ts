import type { ResourceLanguage } from 'i18next';
import type { Language } from '../../../i18n/languages.ts';
import type { StoredAnswers } from './stored-answers.ts';
import type { WizardShop } from './wizard-context.ts';

/** What each page of the wizard is given by its route. */
export interface WizardPageProps {
  language: Language;
  /** Of the frame and of the page itself. */
  words: ResourceLanguage;
  trialId: string;
  readerId: string;
  mayWrite: boolean;
  first: StoredAnswers;
  shop: WizardShop;
}

export function addressOf(trialId: string, step: string): string {
  return `/trials/${trialId}/${step}`;
}

/** What a link to the first missing answer ends with: the page is then checked as it opens. */
export const toDoHash = '#to-do';
