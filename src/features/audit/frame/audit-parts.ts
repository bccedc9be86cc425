/** The pages of an audit, in the order in which an engineer asks. */
export const auditParts = [
  'plan',
  'data',
  'model',
  'checks',
  'prediction',
  'check-runs',
  'models',
  'sign-off',
] as const;
export type AuditPart = (typeof auditParts)[number];

/** Which result of the trial is looked at, and by which model; its own unless told. */
export interface AuditLook {
  result?: number | undefined;
  model?: string | undefined;
}

export function auditAddress(trialId: string, part: AuditPart, look: AuditLook = {}, place = ''): string {
  const query = new URLSearchParams();
  if (look.result) query.set('result', String(look.result));
  if (look.model) query.set('model', look.model);
  const asked = query.size > 0 ? `?${query}` : '';
  return `/trials/${trialId}/audit${part === 'plan' ? '' : `/${part}`}${asked}${place ? `#${place}` : ''}`;
}

/** What an address asks for; anything else is the trial's own main result. */
export function readLook(query: URLSearchParams): AuditLook {
  const result = Number(query.get('result') ?? 0);
  const model = query.get('model') ?? undefined;
  return {
    ...(Number.isInteger(result) && result > 0 && result <= 3 ? { result } : {}),
    ...(model ? { model } : {}),
  };
}
