import { parseTypedNumber } from '../../../i18n/format.ts';
import type { ModelSpec, PublicModel } from '../model.schema.ts';

export type TransformKind = ModelSpec['transform']['kind'];

/** What stands in the form of a model, as typed. */
export interface ModelForm {
  name: string;
  terms: string[];
  refuseHierarchy: boolean;
  transform: TransformKind;
  lambda: string;
  without: { run: string; reason: string }[];
  stretchesAsBlocks: boolean;
  error: ModelSpec['error'];
}

/** Which scales make sense for a result. */
export function transformsFor(kind: 'measured' | 'rejects' | 'flaws'): TransformKind[] {
  return kind === 'rejects' ? ['none', 'arcsine'] : ['none', 'log', 'sqrt', 'boxCox'];
}

export function emptyForm(terms: readonly string[]): ModelForm {
  return {
    name: '',
    terms: [...terms],
    refuseHierarchy: false,
    transform: 'none',
    lambda: '',
    without: [],
    stretchesAsBlocks: false,
    error: 'ladder',
  };
}

export function formOf({ name, spec }: Pick<PublicModel, 'name' | 'spec'>): ModelForm {
  const { transform, without, terms, refuseHierarchy, stretchesAsBlocks, error } = spec;
  return {
    name,
    terms,
    refuseHierarchy,
    stretchesAsBlocks,
    error,
    transform: transform.kind,
    lambda: transform.kind === 'boxCox' ? String(transform.lambda) : '',
    without: without.map(({ run, reason }) => ({ run: String(run), reason })),
  };
}

export interface FormFaults {
  name?: true;
  terms?: true;
  lambda?: true;
  /** Places of left-out runs without a run or a reason. */
  without: number[];
}

/** What the server would refuse, found before it is asked. */
export function faultsOf(form: ModelForm): FormFaults {
  const lambda = parseTypedNumber(form.lambda);
  const lacksLambda = form.transform === 'boxCox' && (lambda === null || Math.abs(lambda) > 3);
  return {
    ...(form.name.trim() === '' ? { name: true as const } : {}),
    ...(form.terms.length === 0 ? { terms: true as const } : {}),
    ...(lacksLambda ? { lambda: true as const } : {}),
    without: form.without.flatMap(({ run, reason }, place) =>
      run === '' || reason.trim().length < 3 ? [place] : [],
    ),
  };
}

export function hasFaults({ without, ...faults }: FormFaults): boolean {
  return without.length > 0 || Object.keys(faults).length > 0;
}

export function specOf(form: ModelForm, result: number): ModelSpec {
  const { transform } = form;
  return {
    result,
    terms: form.terms,
    refuseHierarchy: form.refuseHierarchy,
    transform:
      transform === 'boxCox'
        ? { kind: transform, lambda: parseTypedNumber(form.lambda) ?? 1 }
        : { kind: transform },
    without: form.without.map(({ run, reason }) => ({ run: Number(run), reason: reason.trim() })),
    stretchesAsBlocks: form.stretchesAsBlocks,
    error: form.error,
  };
}
