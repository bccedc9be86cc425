import { useQuestionForm } from '../use-question-form.tsx';

/** Shifts and ways as one form: a person who leaves the shifts leaves the ways too. */
export function useCrew() {
  return useQuestionForm('crew');
}
export type CrewForm = ReturnType<typeof useCrew>;
