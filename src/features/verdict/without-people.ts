import type { VerdictView } from './verdict-view.ts';

/**
 * A verdict for whoever comes by a link: nothing that was typed about people or by somebody in words of their own leaves
 * the shop. Names of settings, machine and trial stay, for without them it says nothing.
 */
export function withoutPeople(view: VerdictView): VerdictView {
  return {
    ...view,
    mayDecide: false,
    call: [],
    hazards: view.hazards.map((hazard) => ({ ...hazard, protects: '' })),
    stop: { ...view.stop, own: '' },
    decisions: view.decisions.map((decision) => ({ ...decision, note: '' })),
  };
}
