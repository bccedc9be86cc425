// npm run bench:verdict [-- worth confirmation calibration power coverage calls promises counts timing] : simulations behind the verdict, written to tests/reports.

import { report } from './report.ts';
import { reportConfirmation, reportWorth } from './report-advice.ts';
import { reportCalibration, reportCalls, reportCounts, reportCoverage } from './report-calls.ts';
import { reportPower, reportPromises } from './report-power.ts';
import { markdownTable } from './simulation.ts';
import { measureTimings } from './timing.ts';

function timing(): void {
  report(
    'timing',
    'Time once warm',
    'Milliseconds, 400 repetitions: shortest and median. The shortest is what the code needs; the median is what a busy machine gave it.',
    markdownTable(['trial', 'analyze', 'judge', 'bestBet', 'all, shortest'], measureTimings()),
  );
}

const tables = {
  worth: reportWorth,
  confirmation: reportConfirmation,
  calibration: reportCalibration,
  power: reportPower,
  coverage: reportCoverage,
  calls: reportCalls,
  promises: reportPromises,
  counts: reportCounts,
  timing,
};
const wanted = process.argv.slice(2);
for (const [name, make] of Object.entries(tables)) if (wanted.length === 0 || wanted.includes(name)) make();
