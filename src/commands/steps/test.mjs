// @ts-check
import { runSteps } from './run-steps.mjs';
import {
  browserStep,
  buildStep,
  installStep,
  integrationStep,
  lintStep,
  typesStep,
  unitStep,
} from './steps.mjs';

// The first checkers and the build use one core each; unit tests fill what they leave.
await runSteps([installStep, [[typesStep, lintStep, buildStep], [unitStep]], integrationStep, browserStep]);
