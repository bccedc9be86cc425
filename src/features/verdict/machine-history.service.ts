import type { ShopScope } from '../../server/db/scope.ts';
import { findLatestPlan } from '../trial/plan.repository.ts';
import { isAdopted } from './decision.ts';
import { listMachineTrials, type MachineDecision } from './machine-history.repository.ts';
import type { MachineHistory, MachineTrial } from './machine-history.ts';

const isAdoption = ({ outcome }: MachineDecision) => outcome === 'adopt' || outcome === 'adopt unchecked';

/** A machine's trials with what came of each, and the settings that were taken over last. */
export async function readMachineHistory(scope: ShopScope, machine: string): Promise<MachineHistory> {
  const found = await listMachineTrials(scope, machine);
  const adopted = found
    .filter(({ state, decisions }) => state === 'closed' && isAdopted(decisions))
    .flatMap((trial) => {
      const taken = trial.decisions.find(isAdoption);
      return taken ? [{ trial, taken }] : [];
    })
    .sort((one, other) => other.taken.decided_at - one.taken.decided_at);
  const [last] = adopted;
  const plan = last ? await findLatestPlan(scope, last.trial.id, 'main') : null;
  return {
    inUse:
      last && plan
        ? {
            trialId: last.trial.id,
            number: last.trial.number,
            since: last.taken.decided_at,
            unchecked: last.taken.outcome === 'adopt unchecked',
            settings: plan.brief.factors.map((factor, place) => ({
              name: factor.panelName ?? factor.name,
              value: last.taken.settings.values[place] ?? '',
              unit: factor.kind === 'number' ? factor.unit : '',
            })),
          }
        : null,
    trials: found.map(
      ({ id, number, title, state, updated_at, decisions }): MachineTrial => ({
        id,
        number,
        title,
        state,
        outcome: decisions[0]?.outcome ?? null,
        at: decisions[0]?.decided_at ?? updated_at,
      }),
    ),
  };
}
