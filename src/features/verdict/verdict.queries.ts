import { z } from 'zod';
import { callServer } from '../../components/island/call-server.ts';
import { type PublicTrial, publicTrialSchema } from '../trial/trial.schema.ts';
import type { CheckBack } from './check-back.schema.ts';
import type { NextTrialWish } from './next-trial.schema.ts';
import { type MadeShare, madeShareSchema } from './share.schema.ts';

export function shareVerdictCall(trialId: string): Promise<MadeShare> {
  return callServer(`/api/trials/${trialId}/share`, { method: 'POST', body: {}, output: madeShareSchema });
}

export function endShareCall(trialId: string, id: string): Promise<undefined> {
  return callServer(`/api/trials/${trialId}/share/${id}`, { method: 'DELETE', output: z.undefined() });
}

export function nextTrialCall(trialId: string, body: NextTrialWish): Promise<PublicTrial> {
  return callServer(`/api/trials/${trialId}/next`, { method: 'POST', body, output: publicTrialSchema });
}

export function checkBackCall(trialId: string, body: CheckBack): Promise<undefined> {
  return callServer(`/api/trials/${trialId}/check-back`, { method: 'POST', body, output: z.undefined() });
}
