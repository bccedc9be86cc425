import { coach, layOutRuns, PlanError, type Proposal, proposePlans } from '../../../lib/doe/index.ts';
import { aroundThings } from '../answer-choices.ts';
import type { Answers, QuestionName } from '../answers.schema.ts';
import { contentOf, finishedSchemas } from '../finished.schema.ts';
import { toBrief } from '../to-brief.ts';
import { readToday } from './read-today.ts';
import { toDraft } from './to-draft.ts';
import type { SoFar } from './wizard-context.ts';

/** What is taken for a question that a plan can do without until it is answered. */
const untilAnswered: Answers = {
  measuring: {},
  usual: { notSure: true },
  limit: { noLimit: true },
  watch: { results: [] },
  neverRun: { mixes: [] },
  around: Object.fromEntries(
    aroundThings.map((thing) => [thing, { way: thing === 'crew' ? 'writeDown' : 'noIssue' }]),
  ),
  spare: {},
  look: { mixes: [] },
};

/** The order is drawn afresh when the trial starts; a fixed one keeps the rack still while somebody types. */
const sketchSeed = 1;

function fillIn(answers: Answers): Answers {
  const filled: Record<string, unknown> = { ...answers };
  for (const question of Object.keys(untilAnswered) as QuestionName[]) {
    const isFinished = finishedSchemas[question].safeParse(contentOf(answers, question)).success;
    if (!isFinished) filled[question] = untilAnswered[question];
  }
  return filled as Answers;
}

function propose(filled: Answers): Omit<SoFar, 'coaching' | 'today'> {
  const nothing = { brief: null, proposals: [], runs: [], racks: [], misfit: null, missing: 0 };
  const read = toBrief(filled);
  if ('problems' in read) return { ...nothing, missing: read.problems.length };
  const { brief } = read;
  try {
    const proposals = proposePlans(brief);
    const racks = proposals.map((proposal: Proposal) => layOutRuns(brief, proposal, sketchSeed));
    return { brief, proposals, runs: racks[0] ?? [], racks, misfit: null, missing: 0 };
  } catch (thrown) {
    if (!(thrown instanceof PlanError)) throw thrown;
    const { code, field, need } = thrown;
    return { ...nothing, brief, misfit: { code, field, need } };
  }
}

/** What the answers mean, with stand-ins for what is not asked yet: plans, and what is worth remarking. */
export function workOutSoFar(answers: Answers): SoFar {
  return { ...propose(fillIn(answers)), coaching: coach(toDraft(answers)), today: readToday(answers) };
}
