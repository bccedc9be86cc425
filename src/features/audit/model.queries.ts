import { z } from 'zod';
import { callServer } from '../../components/island/call-server.ts';
import { type PublicModel, publicModelSchema, type SaveModel } from './model.schema.ts';

const pathOf = (trialId: string, id: string) => `/api/trials/${trialId}/models/${id}`;

export function saveModelCall(trialId: string, id: string, body: SaveModel): Promise<PublicModel> {
  return callServer(pathOf(trialId, id), { method: 'PUT', body, output: publicModelSchema });
}

export function removeModelCall(trialId: string, id: string): Promise<undefined> {
  return callServer(pathOf(trialId, id), { method: 'DELETE', output: z.undefined() });
}
