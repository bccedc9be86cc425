import { z } from 'zod';
import { runTemplates } from './run-templates.ts';
import { mail, text } from './template-kind.ts';
import { verdictTemplates } from './verdict-templates.ts';

export type { Template } from './template-kind.ts';

const none = z.strictObject({});
const link = z.url({ protocol: /^https?$/ });
const reviewed = z.strictObject({ reviewer: z.string(), trial: z.string(), link });
const reviewedText = z.strictObject({ shop: z.string(), reviewer: z.string(), trial: z.string() });

/** Every text and mail there is. A test writes each of them in each language. */
export const templates = {
  consent: text(
    {
      version: 1,
      audience: 'asked',
      answersText: false,
      params: z.strictObject({ shop: z.string(), asker: z.string() }),
    },
    (t, params) => t('texts:consent', params),
  ),
  practice: text({ version: 1, audience: 'agreed', answersText: true, params: none }, (t) =>
    t('texts:practice'),
  ),
  practiceSaved: text(
    { version: 1, audience: 'agreed', answersText: true, params: z.strictObject({ value: z.string() }) },
    (t, params) => t('texts:practiceSaved', params),
  ),
  textsCheck: text(
    { version: 1, audience: 'agreed', answersText: false, params: z.strictObject({ shop: z.string() }) },
    (t, params) => t('texts:textsCheck', params),
  ),
  invitation: mail(
    {
      version: 1,
      holdsSecret: true,
      params: z.strictObject({ shop: z.string(), inviter: z.string(), link, days: z.number().int() }),
    },
    (t, { days, ...params }) => ({
      subject: t('mail:invitation.subject', params),
      body: t('mail:invitation.body', { ...params, validity: t('mail:linkDays', { count: days }) }),
    }),
  ),
  reset: mail(
    { version: 1, holdsSecret: true, params: z.strictObject({ link, minutes: z.number().int() }) },
    (t, { link: address, minutes }) => ({
      subject: t('mail:reset.subject'),
      body: t('mail:reset.body', { link: address, validity: t('mail:linkMinutes', { count: minutes }) }),
    }),
  ),
  emailChanged: mail(
    { version: 1, holdsSecret: false, params: z.strictObject({ name: z.string(), shop: z.string() }) },
    (t, params) => ({
      subject: t('mail:emailChanged.subject'),
      body: t('mail:emailChanged.body', params),
    }),
  ),
  planWaiting: mail(
    {
      version: 1,
      holdsSecret: false,
      params: z.strictObject({ asker: z.string(), trial: z.string(), link }),
    },
    (t, params) => ({
      subject: t('mail:planWaiting.subject', params),
      body: t('mail:planWaiting.body', params),
    }),
  ),
  planSentBack: mail({ version: 1, holdsSecret: false, params: reviewed }, (t, params) => ({
    subject: t('mail:planSentBack.subject', params),
    body: t('mail:planSentBack.body', params),
  })),
  planApproved: mail({ version: 1, holdsSecret: false, params: reviewed }, (t, params) => ({
    subject: t('mail:planApproved.subject', params),
    body: t('mail:planApproved.body', params),
  })),
  verdictReady: mail(
    { version: 1, holdsSecret: false, params: z.strictObject({ trial: z.string(), link }) },
    (t, params) => ({
      subject: t('mail:verdictReady.subject', params),
      body: t('mail:verdictReady.body', params),
    }),
  ),
  planWaitingText: text(
    {
      version: 1,
      audience: 'agreed',
      answersText: false,
      params: z.strictObject({ shop: z.string(), asker: z.string(), trial: z.string() }),
    },
    (t, params) => t('texts:planWaitingText', params),
  ),
  planSentBackText: text(
    { version: 1, audience: 'agreed', answersText: false, params: reviewedText },
    (t, params) => t('texts:planSentBackText', params),
  ),
  planApprovedText: text(
    { version: 1, audience: 'agreed', answersText: false, params: reviewedText },
    (t, params) => t('texts:planApprovedText', params),
  ),
  ...runTemplates,
  ...verdictTemplates,
} as const;

export type TemplateName = keyof typeof templates;
export type TemplateParams<Name extends TemplateName> = z.output<(typeof templates)[Name]['params']>;

export const templateNames = Object.keys(templates) as TemplateName[];

export function isTemplateName(name: string): name is TemplateName {
  return Object.hasOwn(templates, name);
}
