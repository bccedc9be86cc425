import type { PublicPerson } from './public-person.ts';
import type { PeopleReader } from './reach.ts';

/** What every part of a person's page works with. */
export interface PersonPart<Words> {
  readonly person: PublicPerson;
  readonly reader: PeopleReader;
  /** Hears of the person as the server answered after a change. */
  readonly onChange: (person: PublicPerson) => void;
  /** Shows a short word on what was just done. */
  readonly say: (tone: 'good' | 'info', words: Words) => void;
}
