import type { IconName } from '../components/ui/Icon.tsx';
import type { Translate } from '../i18n/translator.ts';
import type { Permission } from '../server/auth/permissions.ts';
import { type Viewer, viewerMay } from '../server/auth/viewer.ts';

interface Place {
  href: string;
  key: 'trials' | 'people' | 'shop' | 'activity';
  icon: IconName;
  /** Any of these opens the page. */
  permissions: Permission[];
  /** Whose first page it is, where that is not everybody who may open it. */
  startsFor?: Permission[];
}

/** The main pages in the order of the menu; each is shown to those who may open it. */
const places: Place[] = [
  {
    href: '/trials',
    key: 'trials',
    icon: 'tag',
    permissions: ['trial.read'],
    startsFor: ['trial.write', 'audit.read'],
  },
  { href: '/people', key: 'people', icon: 'people', permissions: ['people.manage', 'operator.invite'] },
  { href: '/shop', key: 'shop', icon: 'settings', permissions: ['shop.manage'] },
  { href: '/activity', key: 'activity', icon: 'clock', permissions: ['activity.read'] },
];

/** The menu for this person, with the page they are on marked. */
export function navigationFor(viewer: Viewer, path: string, t: Translate) {
  return places
    .filter((place) => place.permissions.some((permission) => viewerMay(viewer, permission)))
    .map(({ href, key, icon }) => ({
      href,
      icon,
      label: t(`common:${key}`),
      current: path === href || path.startsWith(`${href}/`),
    }));
}

/** The page a person lands on after signing in. */
export function startPageFor(viewer: Viewer): string {
  const first = places.find(({ permissions, startsFor = permissions }) =>
    startsFor.some((permission) => viewerMay(viewer, permission)),
  );
  return first?.href ?? '/me';
}
