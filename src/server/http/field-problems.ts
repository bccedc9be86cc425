// Forms in the browser need it too, so it lives where both may import it.
export { fieldProblems, pointerTo } from '../../i18n/field-problems.ts';
