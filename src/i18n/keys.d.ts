import type audit from '../../locales/en/audit.json';
import type auditModel from '../../locales/en/audit-model.json';
import type auditModels from '../../locales/en/audit-models.json';
import type auditPack from '../../locales/en/audit-pack.json';
import type auditReview from '../../locales/en/audit-review.json';
import type auditSource from '../../locales/en/audit-source.json';
import type board from '../../locales/en/board.json';
import type common from '../../locales/en/common.json';
import type errors from '../../locales/en/errors.json';
import type front from '../../locales/en/front.json';
import type mail from '../../locales/en/mail.json';
import type myPage from '../../locales/en/my-page.json';
import type people from '../../locales/en/people.json';
import type phone from '../../locales/en/phone.json';
import type planFacts from '../../locales/en/plan-facts.json';
import type planReview from '../../locales/en/plan-review.json';
import type runTexts from '../../locales/en/run-texts.json';
import type safety from '../../locales/en/safety.json';
import type shop from '../../locales/en/shop.json';
import type signIn from '../../locales/en/sign-in.json';
import type starters from '../../locales/en/starters.json';
import type texts from '../../locales/en/texts.json';
import type trials from '../../locales/en/trials.json';
import type verdict from '../../locales/en/verdict.json';
import type verdictPage from '../../locales/en/verdict-page.json';
import type wizard from '../../locales/en/wizard.json';
import type wizardFrame from '../../locales/en/wizard-frame.json';
import type wizardPlan from '../../locales/en/wizard-plan.json';
import type wizardSafety from '../../locales/en/wizard-safety.json';

// A key that is not in the English files, or a placeholder left out, is a type error.
declare module 'i18next' {
  interface CustomTypeOptions {
    defaultNS: 'common';
    resources: {
      'audit-pack': typeof auditPack;
      'wizard-safety': typeof wizardSafety;
      safety: typeof safety;
      'plan-review': typeof planReview;
      board: typeof board;
      common: typeof common;
      errors: typeof errors;
      front: typeof front;
      mail: typeof mail;
      'my-page': typeof myPage;
      'sign-in': typeof signIn;
      people: typeof people;
      phone: typeof phone;
      'plan-facts': typeof planFacts;
      'run-texts': typeof runTexts;
      shop: typeof shop;
      starters: typeof starters;
      texts: typeof texts;
      trials: typeof trials;
      wizard: typeof wizard;
      'wizard-frame': typeof wizardFrame;
      verdict: typeof verdict;
      'wizard-plan': typeof wizardPlan;
      'verdict-page': typeof verdictPage;
      audit: typeof audit;
      'audit-model': typeof auditModel;
      'audit-models': typeof auditModels;
      'audit-review': typeof auditReview;
      'audit-source': typeof auditSource;
    };
  }
}
