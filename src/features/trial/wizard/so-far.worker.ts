import type { Answers } from '../answers.schema.ts';
import { workOutSoFar } from './work-out-so-far.ts';

// Runs beside the page, so that planning never holds up the typing.
addEventListener('message', ({ data }: MessageEvent<Answers>) => {
  postMessage(workOutSoFar(data));
});
