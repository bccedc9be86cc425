import { z } from 'zod';
import { mail, text } from './template-kind.ts';

const words = z.string();
const link = z.url({ protocol: /^https?$/ });
/** What an engineer is asked about: a verdict, or that its settings are used from now on. */
const what = z.enum(['verdict', 'adoption']);
const told = { version: 1, audience: 'agreed', answersText: false } as const;
const mailed = { version: 1, holdsSecret: false } as const;
const asked = z.strictObject({ what, asker: words, trial: words });
const decided = z.strictObject({ what, reviewer: words, trial: words });

/** What is told after a trial: a verdict that waits for the engineer, settings that are used from now on, and how they hold. */
export const verdictTemplates = {
  signOffWaiting: mail({ ...mailed, params: asked.extend({ link }) }, (t, params) => ({
    subject: t(`mail:signOff.${params.what}.waiting.subject`, params),
    body: t(`mail:signOff.${params.what}.waiting.body`, params),
  })),
  signOffApproved: mail({ ...mailed, params: decided.extend({ link }) }, (t, params) => ({
    subject: t(`mail:signOff.${params.what}.approved.subject`, params),
    body: t(`mail:signOff.${params.what}.approved.body`, params),
  })),
  signOffSentBack: mail({ ...mailed, params: decided.extend({ link }) }, (t, params) => ({
    subject: t(`mail:signOff.${params.what}.sentBack.subject`, params),
    body: t(`mail:signOff.${params.what}.sentBack.body`, params),
  })),
  settingsInUse: mail(
    {
      ...mailed,
      params: z.strictObject({ machine: words, trial: words, settings: words, back: words, link }),
    },
    (t, params) => ({
      subject: t('mail:settingsInUse.subject', params),
      body: t('mail:settingsInUse.body', params),
    }),
  ),
  checkBack: mail(
    { ...mailed, params: z.strictObject({ machine: words, trial: words, settings: words, link }) },
    (t, params) => ({ subject: t('mail:checkBack.subject', params), body: t('mail:checkBack.body', params) }),
  ),
  signOffWaitingText: text({ ...told, params: asked.extend({ shop: words }) }, (t, params) =>
    t(`texts:signOff.${params.what}.waiting`, params),
  ),
  signOffApprovedText: text({ ...told, params: decided.extend({ shop: words }) }, (t, params) =>
    t(`texts:signOff.${params.what}.approved`, params),
  ),
  signOffSentBackText: text({ ...told, params: decided.extend({ shop: words }) }, (t, params) =>
    t(`texts:signOff.${params.what}.sentBack`, params),
  ),
  settingsInUseText: text(
    { ...told, params: z.strictObject({ machine: words, settings: words, caller: words }) },
    (t, params) => t('texts:settingsInUse', params),
  ),
  checkBackText: text({ ...told, params: z.strictObject({ machine: words, trial: words }) }, (t, params) =>
    t('texts:checkBack', params),
  ),
} as const;
