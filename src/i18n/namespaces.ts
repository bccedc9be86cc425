/** One namespace is one file in `locales/<language>/`. A new one is named here and in `keys.d.ts`. */
export const namespaces = [
  'common',
  'errors',
  'front',
  'starters',
  'plan-facts',
  'trials',
  'wizard-plan',
  'texts',
  'run-texts',
  'board',
  'mail',
  'people',
  'phone',
  'shop',
  'sign-in',
  'my-page',
  'wizard',
  'wizard-frame',
  'verdict',
  'plan-review',
  'safety',
  'wizard-safety',
  'verdict-page',
  'audit',
  'audit-model',
  'audit-source',
  'audit-pack',
] as const;

export type Namespace = (typeof namespaces)[number];
export type Namespaces = typeof namespaces;
