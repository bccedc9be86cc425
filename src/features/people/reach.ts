import { isOperatorOnly, type PersonRole } from './person.ts';

/** Whom somebody may see and change: everybody of the shop, or (a supervisor who invites) its operators alone. */
export type Reach = 'everybody' | 'operators';

/** What the person who asks may do and see. */
export interface PeopleReader {
  reach: Reach;
  /** Whole numbers, or only their last digits. */
  seesPhones: boolean;
}

export function isWithinReach(person: { roles: readonly PersonRole[] }, reach: Reach): boolean {
  return reach === 'everybody' || isOperatorOnly(person);
}
