// npm run bench:faults : web and worker of the built product killed 100 times while 506 runs go out by text and come back.
// Ends with 1 when a reading or a prompt was lost. Loopback only; ends by itself.

import { markdownTable } from '../verdict/simulation.ts';
import { runWhileKilled } from './killed-often.ts';
import { describeMachine, report } from './report.ts';

const machine = describeMachine();
const outcome = await runWhileKilled({
  kills: 100,
  trials: 46,
  seed: 20_261_201,
  limitMilliseconds: 1_200_000,
});
const { kills, runs, reached, keptOnce, keptBesides, duplicates, missed, seconds } = outcome;
const isWhole = reached === runs && keptOnce === runs && keptBesides === 0;

report('texts-killed', 'Killed while texts go out and readings come in', [
  'Web and worker are programs of their own, killed by SIGKILL at random moments and started again. The stand-in for the text service tells everything twice, late or in the wrong order. 46 phones answer every run they are sent, once.',
  markdownTable(
    ['what', 'count'],
    [
      ['web killed', kills.web],
      ['worker killed', kills.worker],
      ['runs that went out by text', runs],
      ['runs that reached their phone', reached],
      ['texts that the service handed over twice', duplicates],
      ['readings kept once, as sent', keptOnce],
      ['readings kept besides', keptBesides],
      ['calls of a webhook that nobody heard', missed],
      ['seconds', seconds],
    ],
  ),
  machine,
]);
console.log(outcome);
process.exitCode = isWhole ? 0 : 1;
