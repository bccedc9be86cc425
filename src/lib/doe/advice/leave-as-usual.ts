import { beliefOf } from './belief.ts';
import { type Choice, type ChoiceQuestion, chooseSettings, meritOf } from './choose-settings.ts';

export interface StayQuestion extends Omit<ChoiceQuestion, 'candidates'> {
  /** The settings with the best expectation. */
  chosen: Choice;
  /** Places of settings that are not worth moving, by their calls. */
  mayStay: readonly number[];
  /** What may be proposed where these places stay as usual. */
  candidatesWith(stay: ReadonlySet<number>): readonly (readonly number[])[];
  /** W on the scale of the analysis; 0 where it is not given, and then nothing is given up. */
  worth: number;
}

/** How much of W may be given up in all so that settings stay as they are. A judgment. */
const MAY_GIVE_UP = 0.5;
/** How likely it must be that less than W is given up. */
const SURELY = 0.975;

/**
 * Leaves settings as they are that the readings say are not worth moving, the cheapest first: a change of the machine costs
 * the crew something, so one that brings less than they care about is no advice. All that stay together are expected to
 * give up at most half of W and surely give up less than W; and no limit may be lost by it.
 */
export function leaveAsUsual(question: StayQuestion): Choice {
  const { chosen, mayStay, usual, worth } = question;
  const moved = worth > 0 ? mayStay.filter((place) => chosen.x[place] !== usual[place]) : [];
  const merit = meritOf(question);
  const floor = merit(chosen.x) - MAY_GIVE_UP * worth;
  const stay = new Set<number>();
  let left = chosen;
  while (stay.size < moved.length) {
    const tries = moved
      .filter((place) => !stay.has(place))
      .flatMap((place) => {
        const choice = bestWith(question, new Set([...stay, place]));
        const value = choice === null ? 0 : merit(choice.x);
        return choice === null || value < floor || !isCheap(question, choice.x)
          ? []
          : [{ place, choice, value }];
      });
    const [next] = tries.sort((first, second) => second.value - first.value);
    if (next === undefined) break;
    stay.add(next.place);
    left = next.choice;
  }
  return left;
}

/** The best where these settings stay; null: no limit may be lost by it, and something allowed must be left. */
function bestWith(question: StayQuestion, stay: ReadonlySet<number>): Choice | null {
  const candidates = question.candidatesWith(stay);
  if (candidates.length === 0) return null;
  const choice = chooseSettings({ ...question, candidates });
  return choice.limitsHold === question.chosen.limitsHold ? choice : null;
}

/** Whether what is given up against the best is less than W but for bad luck. */
function isCheap({ brief, models, chosen, worth }: StayQuestion, x: readonly number[]): boolean {
  const [main] = models;
  // For a target the expected distance has been compared; a difference between two settings says nothing more.
  if (main === undefined || brief.response.goal === 'target') return true;
  const lost = beliefOf(main.change(x, chosen.x), 0, brief.response.goal === 'more' ? 1 : -1);
  return lost.above(worth) <= 1 - SURELY;
}
