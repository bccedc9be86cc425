/** One thing that stands differently in two answers: what was typed, or a choice by its name. */
export type Difference = { kind: 'typed' | 'choice'; text: string };

/** Fields that hold one of a list of names instead of what somebody typed. */
const choiceFields =
  /(^|\.)(wish|kind|when|who|limitFor|harderEnd|starter|hazard|fate|way|next|decision|setting|end|picked|cautions|ticked|ways)(\.|$)/;
/** Names of rows, which nobody sees. */
const hiddenFields = /(^|\.)id$/;

function leavesOf(content: unknown, path = ''): Map<string, unknown> {
  if (typeof content !== 'object' || content === null) return new Map([[path, content]]);
  const entries = Object.entries(content).flatMap(([name, value]) => [
    ...leavesOf(value, path === '' ? name : `${path}.${name}`),
  ]);
  return new Map(entries.filter(([name, value]) => !hiddenFields.test(name) && value !== ''));
}

function describe(path: string, value: unknown): Difference {
  const name = typeof value === 'boolean' ? path.slice(path.lastIndexOf('.') + 1) : String(value);
  const isChoice =
    typeof value === 'boolean' ||
    choiceFields.test(path) ||
    (/(^|\.)usual$/.test(path) && (name === 'low' || name === 'high'));
  return { kind: isChoice ? 'choice' : 'typed', text: name };
}

/** What stands in `one` and not, or otherwise, in `other`, in the order of the form. */
export function differencesOf(one: unknown, other: unknown): Difference[] {
  const others = leavesOf(other ?? {});
  return [...leavesOf(one ?? {})]
    .filter(([path, value]) => value !== undefined && value !== false && others.get(path) !== value)
    .map(([path, value]) => describe(path, value));
}
