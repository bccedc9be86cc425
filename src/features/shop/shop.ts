import type { Language } from '../../i18n/languages.ts';

/** When an engineer must look first. `hazard`: where the trial has one. */
export const reviewRules = ['never', 'hazard', 'always'] as const;
export type ReviewRule = (typeof reviewRules)[number];

/** How long the words of texts and mails are kept after their trial closed, in days. */
export const keepTextsDaysRange = { least: 30, most: 1_095 } as const;

/** The shop and its rules. Minutes are wall minutes after midnight in its zone. */
export interface Shop {
  id: string;
  name: string;
  timeZone: string;
  language: Language;
  /** ISO 4217. */
  currency: string;
  /** E.164; texts to it find this shop. */
  textNumber: string | null;
  quietFromMinute: number | null;
  quietToMinute: number | null;
  planReview: ReviewRule;
  verdictReview: ReviewRule;
  adoptionReview: ReviewRule;
  /** Who answers for safety where no engineer looks at plans, in the admin's words. */
  reviewStatement: string | null;
  plainLetters: boolean;
  keepTextsDays: number;
  /** Texts a month, as the service counts and bills them; null without a limit. */
  monthlyTextLimit: number | null;
  revision: number;
}
