import type { Answers } from '../../src/features/trial/answers.schema.ts';

/** Answers from which a trial can start, typed as people type them: seals on line 3, three settings, hot jaws. */
export function finishedAnswers(more: Answers = {}): Answers {
  return {
    job: { starter: 'sealing', title: 'Line 3 seals', machine: 'Line 3' },
    result: { name: 'seal strength', unit: 'N', wish: 'more', kind: 'measured' },
    measuring: { who: 'operator', when: 'atOnce', partsPerRun: '3' },
    usual: { usual: '35 N', lowest: '31', highest: '39,0' },
    worth: { change: '3,5 N' },
    limit: { atLeast: '38' },
    settings: {
      settings: [
        {
          id: 'temp',
          kind: 'number',
          name: 'Jaw temp',
          panelName: 'JAW TEMP',
          unit: 'C',
          low: '140',
          high: '160 °C',
          usual: '150',
          harderEnd: 'high',
        },
        { id: 'dwell', kind: 'number', name: 'Dwell', unit: 's', low: '0,6', high: '1', usual: '.8' },
        { id: 'film', kind: 'choice', name: 'Film', low: 'Supplier A', high: 'Supplier B', usual: 'low' },
      ],
    },
    hazards: { ticked: [{ hazard: 'hotParts', cautions: ['guardsClosed'] }] },
    stop: { picked: ['smoke', 'someoneHurt'] },
    call: { lines: [{ id: 'day', when: 'day', whom: 'Dana, ext 12' }] },
    neverRun: {
      mixes: [
        {
          id: 'hot and long',
          parts: [
            { setting: 'temp', end: 'high' },
            { setting: 'dwell', end: 'high' },
          ],
        },
      ],
    },
    parts: { fate: 'hold', label: 'HOLD' },
    around: {
      batch: { way: 'same' },
      shift: { way: 'same' },
      machine: { way: 'noIssue' },
      gauge: { way: 'same' },
      room: { way: 'writeDown' },
      crew: { way: 'same' },
    },
    spare: { runs: '20', hoursOpen: true, moneyOpen: true },
    crew: { shifts: [{ id: 'day', name: 'Day', from: '06:00', to: '14:00', runs: 'somebody' }] },
    pace: { next: 'made' },
    ready: { ticked: ['guardsOn', 'crewMaySayNo', 'boxAndLabels', 'enoughMaterial', 'gaugeChecked'] },
    ...more,
  };
}
