import { useBoardTools } from './board-context.tsx';

/** What the server found wrong with figures, by their field: `#/figures/0-1` is the first part of the main result. */
export function useRefusedFields(): Record<string, string> {
  const { fault } = useBoardTools();
  if (fault?.kind !== 'refused') return {};
  return Object.fromEntries(
    fault.problem.errors.map(({ pointer, code }) => [pointer.replace(/^#\/(figures\/)?/, ''), code]),
  );
}
