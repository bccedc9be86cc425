// @ts-check
import { runSteps } from './run-steps.mjs';
import { installStep, lintStep, typesStep, unitStep } from './steps.mjs';

await runSteps([installStep, [[typesStep, lintStep], [unitStep]]]);
