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

await runSteps([installStep, typesStep, lintStep, unitStep, buildStep, integrationStep, browserStep]);
