import type { ShopScope } from '../../server/db/scope.ts';
import type { ListTrials, PublicTrial, TrialsPage } from './trial.schema.ts';
import { listTrials } from './trial.service.ts';
import { countTrials, countTrialsOf } from './trials-list.repository.ts';

export interface TrialsView extends TrialsPage {
  /** The shop has no trial at all, so that nothing can be found. */
  isEmpty: boolean;
  /** A trial that has ended, for somebody who has none of their own yet. */
  example: PublicTrial | null;
}

/** One page of the list with what it says to somebody who is new. */
export async function viewTrials(scope: ShopScope, list: ListTrials, personId: string): Promise<TrialsView> {
  const page = await listTrials(scope, list);
  const isNew = (await countTrialsOf(scope, personId)) === 0;
  const ended: ListTrials = {
    search: '',
    state: 'closed',
    show: 'here',
    sort: 'number',
    direction: 'descending',
    limit: 1,
  };
  const [example = null] = isNew ? (await listTrials(scope, ended)).trials : [];
  return { ...page, isEmpty: page.trials.length === 0 && (await countTrials(scope)) === 0, example };
}
