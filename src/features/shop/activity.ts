import type { Translate } from '../../i18n/translator.ts';

/** Every kind of line that has its words in `shop:kind`. A test finds a kind that is written somewhere and missing here. */
export const activityKinds = [
  'person.added',
  'person.changed',
  'person.roles-changed',
  'person.mail-changed',
  'person.deactivated',
  'person.activated',
  'person.invited',
  'person.exported',
  'person.erased',
  'people.imported',
  'shop.changed',
  'shop.set-up',
  'shop.texts-checked',
  'consent.asked',
  'consent.given',
  'consent.declined',
  'consent.withdrawn',
  'consent.reset',
  'invitation.accepted',
  'password.changed',
  'password.reset',
  'profile.changed',
  'session.started',
  'session.ended',
  'sessions.ended',
  'trial.added',
  'trial.imported',
  'trial.deleted',
  'trial.put-away',
  'trial.taken-out',
  'trial.plan-chosen',
  'trial.approval-lapsed',
  'trial.started',
  'trial.paused',
  'trial.held',
  'trial.resumed',
  'trial.ended-early',
  'trial.readings-in',
  'trial.set-back',
  'trial.something-changed',
  'trial.verdict-reopened',
  'run.asked',
  'run.made',
  'run.recorded',
  'run.skipped',
  'run.put-back',
  'run.repeated',
  'run.added',
  'run.handed-over',
  'run.actual-set',
  'run.noted',
  'reading.corrected',
  'reading.confirmed',
  'reading.denied',
  'reading.set-apart',
  'reading.imported',
  'photo.added',
  'photo.removed',
  'phone.read',
  'problem.raised',
  'problem.settled',
  'trial.check-runs',
  'trial.decided',
  'trial.opened-again',
  'trial.followed',
  'trial.checked-back',
  'verdict.made',
  'model.saved',
  'model.removed',
  'verdict.shared',
  'verdict.share-ended',
  'review.asked',
  'review.approved',
  'review.sent-back',
  'review.taken-back',
  'review.commented',
  'review.comment-settled',
  'review.comment-reopened',
  'review.skipped',
  'token.added',
  'token.ended',
] as const;
export type ActivityKind = (typeof activityKinds)[number];

function isKnown(kind: string): kind is ActivityKind {
  return activityKinds.some((known) => known === kind);
}

/** What happened, in words. A kind written by a newer version is shown by its code, so that no line is hidden. */
export function describeKind(kind: string, t: Translate): string {
  return isKnown(kind) ? t(`shop:kind.${kind}`) : kind;
}

/** The figures of a line without the version of their layout; nothing where there are none. */
export function describeDetails(details: string): string {
  const { v: _, ...figures } = JSON.parse(details) as Record<string, unknown>;
  return Object.keys(figures).length === 0 ? '' : JSON.stringify(figures);
}
