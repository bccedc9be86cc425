import { useQuestionForm } from '../use-question-form.tsx';

/** What one can spare, as a form: sliders, fields and buttons all write to it. */
export function useSpare() {
  return useQuestionForm('spare');
}
export type SpareForm = ReturnType<typeof useSpare>;

/** Sets a limit to an amount, or lifts it. A number of runs is always a limit. */
export function relaxTo(form: SpareForm, limit: 'runs' | 'hours' | 'money', amount: number | null): void {
  const wishes = { shouldValidate: true, shouldDirty: true };
  form.setValue(limit, amount === null ? '' : String(amount), wishes);
  if (limit === 'hours') form.setValue('hoursOpen', amount === null, wishes);
  if (limit === 'money') form.setValue('moneyOpen', amount === null, wishes);
}
