/** The roles a person may hold; several at once. */
export const roles = ['supervisor', 'engineer', 'admin', 'operator'] as const;
export type Role = (typeof roles)[number];

/**
 * Who may do what. Roles add up. Operators come by a link and so do readers of a shared verdict: `byLink` lists what
 * such a link opens, always within its own trial.
 */
const rolesOf = {
  'trial.read': ['supervisor', 'engineer', 'admin'],
  'verdict.read': ['supervisor', 'engineer', 'admin'],
  'trial.write': ['supervisor'],
  'trial.run': ['supervisor'],
  'run.record': ['supervisor'],
  'reading.correct': ['supervisor'],
  decide: ['supervisor'],
  'share.manage': ['supervisor'],
  'run.record.own': ['supervisor', 'engineer'],
  'photo.add': ['supervisor', 'engineer'],
  'problem.raise': ['supervisor', 'engineer'],
  'trial.hold': ['supervisor', 'engineer', 'admin'],
  'review.decide': ['engineer'],
  'audit.read': ['engineer'],
  'model.write': ['engineer'],
  'pack.read': ['engineer', 'admin'],
  'token.own': ['engineer'],
  'trial.import': ['supervisor', 'engineer'],
  'people.manage': ['admin'],
  'operator.invite': ['supervisor', 'admin'],
  'phone.read': ['admin'],
  'shop.manage': ['admin'],
  erase: ['admin'],
  'activity.read': ['engineer', 'admin'],
  'own.profile': ['supervisor', 'engineer', 'admin'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof rolesOf;

export const permissions = Object.keys(rolesOf) as Permission[];

export const byLink = {
  operator: ['trial.read', 'run.record.own', 'photo.add', 'problem.raise', 'trial.hold'],
  share: ['verdict.read'],
} as const satisfies Record<string, readonly Permission[]>;

/** Whether any of these roles carries the permission. */
export function rolesMay(held: readonly Role[], permission: Permission): boolean {
  const allowed: readonly Role[] = rolesOf[permission];
  return held.some((role) => allowed.includes(role));
}

export function isRole(text: unknown): text is Role {
  return roles.some((role) => role === text);
}
