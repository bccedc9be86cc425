import { type QuestionName, questionNames } from '../../answers.schema.ts';
import { stepOf, type WizardStep } from '../../questions.ts';

/** The question that a remark is about; null where it is about the plan itself. */
export function questionOfPlace(place: string): QuestionName | null {
  const first = place.split('/')[1];
  return questionNames.find((name) => name === first) ?? null;
}

/** The page of the wizard on which a remark can be dealt with. */
export function stepOfPlace(place: string): WizardStep {
  const question = questionOfPlace(place);
  return question ? stepOf(question) : 'plan';
}
