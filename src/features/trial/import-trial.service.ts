import { AnalysisError, coreVersion } from '../../lib/doe/index.ts';
import { recordActivity } from '../../server/db/activity-log.ts';
import { inTransaction } from '../../server/db/in-transaction.ts';
import type { ShopScope } from '../../server/db/scope.ts';
import { AppError } from '../../server/errors.ts';
import { newId } from '../../server/ids.ts';
import type { ImportedTrial } from '../audit/pack/imported-trial.schema.ts';
import type { TrialFile } from '../audit/pack/trial-file.schema.ts';
import type { RunInFile } from '../audit/pack/trial-file-runs.schema.ts';
import { type Judgement, judgeTrial, type TrialToJudge } from '../verdict/judge-trial.service.ts';
import { isAlike } from './alike.ts';
import { freezeAnswers, insertAnswers } from './answers.repository.ts';
import type { Answers } from './answers.schema.ts';
import { findLooseEnds } from './import-loose-ends.ts';
import { insertTrialFile, setImportedState } from './import-trial.repository.ts';
import { hashOf } from './reviewed-hash.service.ts';
import { insertTrial } from './trial.repository.ts';
import { findTrialOf, type TrialReader } from './trial-reader.service.ts';
import { type TrialState, takesAnswers } from './trial-states.ts';

function toJudgedRun(run: RunInFile) {
  return {
    id: '',
    number: run.number,
    place: run.place,
    block: run.block,
    wholePlot: run.wholePlot,
    group: run.group,
    center: run.center,
    coded: run.coded,
    planned: run.planned,
    actual: run.actual,
    end: run.end,
    readings: run.readings
      .filter(({ state }) => state === 'counts')
      .map(({ result, part, value, rejects, lot }) => ({ result, part, value, rejects, lot }))
      .sort((one, other) => one.result - other.result || one.part - other.part),
  };
}

/** What the file's verdict rests on; null where it has no runs yet. */
function toJudge(file: TrialFile): TrialToJudge | null {
  const last = (phase: 'main' | 'check') => file.plans.filter((plan) => plan.phase === phase).at(-1);
  const main = last('main');
  if (!main || file.runs.length === 0) return null;
  const phaseOf = new Map(file.plans.map(({ n, phase }) => [n, phase]));
  const runsOf = (phase: 'main' | 'check') =>
    file.runs
      .filter((run) => !run.warmUp && phaseOf.get(run.plan) === phase)
      .sort((one, other) => one.place - other.place || one.number - other.number)
      .map(toJudgedRun);
  return { brief: main.brief, proposal: main.proposal, runs: runsOf('main'), checkRuns: runsOf('check') };
}

function refuse(place: string, code: string, cause?: unknown): AppError {
  const about = cause === undefined ? {} : { cause };
  return new AppError('invalid', { fields: [{ pointer: `#/${place}`, code }], ...about });
}

function judgeFile(file: TrialFile): Judgement | null {
  const trial = toJudge(file);
  if (!trial) return null;
  try {
    return judgeTrial(trial);
  } catch (error) {
    // The core refuses settings, terms or readings that make no sense together.
    if (error instanceof RangeError || error instanceof AnalysisError)
      throw refuse('runs', 'does-not-fit', error);
    throw error;
  }
}

/** A verdict is taken over only where the readings beside it say the same; older ones stand as what was shown then. */
function requireHonestVerdicts(file: TrialFile): void {
  const judged = judgeFile(file);
  const plain: unknown = judged && JSON.parse(JSON.stringify(judged));
  file.verdicts.forEach((verdict, index) => {
    if (!judged || verdict.inputHash !== judged.inputHash || verdict.coreVersion !== coreVersion) return;
    const { facts, results } = plain as Judgement;
    if (!isAlike(verdict.facts, facts)) throw refuse(`verdicts/${index}/facts`, 'does-not-follow');
    if (!isAlike(verdict.analysis.results, results)) {
      throw refuse(`verdicts/${index}/analysis`, 'does-not-follow');
    }
  });
  const last = file.verdicts.length - 1;
  const latest = file.verdicts[last];
  if (file.trial.state !== 'closed') return;
  if (!latest) throw refuse('verdicts', 'missing');
  if (latest.coreVersion === coreVersion && latest.inputHash !== judged?.inputHash) {
    throw refuse(`verdicts/${last}/inputHash`, 'does-not-follow');
  }
}

/**
 * Nothing goes out from a trial because its file was brought in: what was running is paused, what was stopped for safety
 * stays stopped, and what waited for somebody's word waits for this shop's.
 */
const stateHere: Record<TrialState, TrialState> = {
  draft: 'draft',
  'plan review': 'draft',
  ready: 'draft',
  running: 'paused',
  paused: 'paused',
  held: 'held',
  'readings in': 'readings in',
  'verdict review': 'readings in',
  deciding: 'readings in',
  'adoption review': 'readings in',
  closed: 'closed',
};

/** What was ticked on the floor of another shop counts there. */
function answersHere(file: TrialFile, state: TrialState): Answers {
  const answers = file.answers.document.questions as Answers;
  if (!takesAnswers(state)) return answers;
  const { ready: _ready, look: _look, ...kept } = answers;
  return kept;
}

/** Nobody here has a run in hand yet, and the plan of a draft is chosen here. */
function fileHere(file: TrialFile, state: TrialState): TrialFile {
  return {
    ...file,
    plans: takesAnswers(state) ? [] : file.plans,
    runs: file.runs.map((run) => (run.state === 'asked' ? { ...run, state: 'waiting', askedAt: null } : run)),
  };
}

/**
 * Brings a whole trial in under the shop's next number, or nothing at all. Its reviews are not taken over: nobody in this
 * shop has agreed to anything. Rows that must name a person name whoever brought the file in.
 * @throws AppError `invalid` naming each place in the file that does not hold
 */
export async function importTrial(
  scope: ShopScope,
  file: TrialFile,
  reader: TrialReader,
): Promise<ImportedTrial> {
  const looseEnds = findLooseEnds(file);
  if (looseEnds.length > 0) throw new AppError('invalid', { fields: looseEnds.slice(0, 100) });
  requireHonestVerdicts(file);
  const state = stateHere[file.trial.state];
  const fileHash = hashOf(file);
  return inTransaction(scope, async (inner) => {
    const id = newId();
    // The line in the log comes first: it locks the shop, so that a number is given once.
    await recordActivity(inner, {
      kind: 'trial.imported',
      subjectId: id,
      trialId: id,
      details: {
        fileHash,
        from: { number: file.trial.number, state: file.trial.state },
        after: { state, runs: file.runs.length, verdicts: file.verdicts.length },
        decisions: file.decisions.length,
      },
    });
    const { title, machine } = file.trial;
    await insertTrial(inner, { id, ownerId: reader.personId, title, machine });
    const answers = answersHere(file, state);
    await insertAnswers(inner, id, { answers, questions: {}, savedBy: reader.personId });
    await insertTrialFile(inner, { trialId: id, personId: reader.personId }, fileHere(file, state));
    await setImportedState(inner, id, { state, phase: file.trial.phase, createdAt: file.trial.createdAt });
    if (!takesAnswers(state)) await freezeAnswers(inner, { trialId: id, version: 1, hash: hashOf(answers) });
    const { number } = await findTrialOf(inner, id);
    return { id, number, state };
  });
}
