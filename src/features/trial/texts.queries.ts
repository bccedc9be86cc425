import { callServer } from '../../components/island/call-server.ts';
import {
  type Practice,
  practiceSchema,
  type TextsPreview,
  textsPreviewSchema,
} from './texts-preview.schema.ts';

/** Run 1 as each language of the crew would get it, from the answers that are saved. */
export function previewTextsCall(trialId: string): Promise<TextsPreview> {
  return callServer(`/api/trials/${trialId}/texts`, { output: textsPreviewSchema });
}

/** Sends run 1 to the caller's own phone. */
export function sendPracticeCall(trialId: string): Promise<Practice> {
  return callServer(`/api/trials/${trialId}/practice`, { method: 'POST', body: {}, output: practiceSchema });
}
