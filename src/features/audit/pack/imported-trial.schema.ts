import { z } from 'zod';
import '../../people/schema-settings.ts';
import { trialStates } from '../../trial/trial-states.ts';

/** POST /api/trials/import answers where the trial now is. */
export const importedTrialSchema = z.object({
  id: z.string(),
  /** Counts up within the shop. */
  number: z.number(),
  state: z.enum(trialStates),
});
export type ImportedTrial = z.output<typeof importedTrialSchema>;
