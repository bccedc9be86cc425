import { type Viewer, viewerMay } from '../../server/auth/viewer.ts';
import type { PeopleReader } from './reach.ts';

/** What a viewer may do with people, by the table of permissions. */
export function peopleReaderOf(viewer: Viewer): PeopleReader {
  return {
    reach: viewerMay(viewer, 'people.manage') ? 'everybody' : 'operators',
    seesPhones: viewerMay(viewer, 'phone.read'),
  };
}
