import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import {
  type Example,
  factorialExamples,
  toAnalysisInput,
} from '../../../tests/builders/reference-examples.ts';
import { formatsFor } from '../../i18n/format.ts';
import { translatorFor } from '../../i18n/translator.ts';
import { type AnalysisInput, analyze, type Brief, plotEffects } from '../../lib/doe/index.ts';
import type { AuditModelView } from './audit-view.ts';
import { auditFiguresFor } from './audit-wording.ts';
import { lenthLines } from './checks/check-lines.ts';
import { EffectPlotTable } from './checks/EffectPlotTable.tsx';
import { FigureLines } from './frame/FigureLines.tsx';
import { ModelFigures } from './model/ModelFigures.tsx';

const t = translatorFor('en');
const wording = { t, formats: formatsFor('en', 'UTC'), figures: auditFiguresFor('en') };

function viewOf(example: Example, input: AnalysisInput): AuditModelView {
  const factors = input.factors.map(({ letter }) => ({ letter, name: `setting ${letter}`, unit: '' }));
  const response: Brief['response'] = { name: 'result', unit: '', kind: 'measured', goal: 'more' };
  return {
    spec: response,
    result: 0,
    factors,
    brief: { response, watch: [], factors: [], forbidden: [], budget: { maxRuns: 64 }, noise: null },
    input,
    analysis: analyze(input),
    transform: { kind: 'none' },
    runNumbers: example.runs.map((_, place) => place + 1),
    name: null,
    inputHash: 'hash',
    verdict: null,
  };
}

/** Half a unit of the last digit of a figure as it is written. */
const halfDigit = (text: string) => 0.5 * 10 ** -(text.split('.')[1]?.length ?? 0) * (1 + 1e-9);
const numberIn = (text: string) => Number(text.replaceAll(',', '').replace('\u2212', '-'));

/** The figure in a column of a row: as shown, and with all its digits. */
function cell(table: HTMLElement, row: string, column: string) {
  const headers = within(table)
    .getAllByRole('columnheader')
    .map(({ textContent }) => textContent);
  const found = within(table)
    .getAllByRole('row')
    .find((each) => each.querySelector('th[scope="row"]')?.textContent === row);
  const data = found?.children[headers.indexOf(column)]?.querySelector('data');
  if (!data) throw new RangeError(`no ${column} of ${row}`);
  return { text: data.textContent ?? '', exact: Number(data.value) };
}

function expectPublished(shown: { text: string; exact: number }, printed: string): void {
  const value = Number(printed);
  expect(Math.abs(shown.exact - value), printed).toBeLessThanOrEqual(halfDigit(printed));
  const room = Math.max(halfDigit(printed), halfDigit(shown.text));
  expect(Math.abs(numberIn(shown.text) - value), `${shown.text} for ${printed}`).toBeLessThanOrEqual(room);
}

const sets = [
  'filtration-2-4',
  'plasma-etch-2-3',
  'bottling-2-3-replicated',
  'isatin-2-4',
  'yield-2-2-centre',
  'pilot-plant-2-3',
  'chemical-2-2-replicated',
];

/** Those without repeats, for which the reference programs worked Lenth's figures out. */
const withLenth = ['filtration-2-4', 'isatin-2-4', 'pilot-plant-2-3'];

describe.each(sets)('the audit of the published experiment %s', (id) => {
  const example = factorialExamples.find((each) => each.id === id);
  if (!example) throw new RangeError(`no example ${id}`);
  const terms = Object.keys(example.computed.effects ?? {});
  const view = viewOf(example, toAnalysisInput(example, { terms, curvatureTerm: false, error: 'ladder' }));
  const printed = example.published.filter(({ agrees }) => agrees);
  const named = (area: string) =>
    printed.flatMap((entry) => {
      const [head, term = ''] = entry.quantity.split('/');
      return head === area ? [{ term, text: entry.printed }] : [];
    });

  it('shows the digits that its source prints', () => {
    render(<ModelFigures model={view} {...wording} />);
    const table = screen.getByRole('table', { name: 'Terms of the model' });
    for (const { term, text } of named('effects')) expectPublished(cell(table, term, 'Effect'), text);
    for (const { term, text } of named('ss')) expectPublished(cell(table, term, 'Sum of squares'), text);
    for (const { text } of named('mean')) expectPublished(cell(table, 'Mean', 'Coefficient'), text);
    const anova = screen.getByRole('table', { name: 'Analysis of variance' });
    for (const { text } of named('total')) expectPublished(cell(anova, 'Total', 'Sum of squares'), text);
    expect(named('effects').length).toBeGreaterThan(2);
  });

  it('shows every effect of its half-normal plot and Lenth’s figures', () => {
    const plot = plotEffects(view.input, view.analysis);
    render(
      <>
        <EffectPlotTable plot={plot} factors={view.factors} {...wording} />
        <FigureLines lines={lenthLines(plot, wording)} />
      </>,
    );
    const table = screen.getByRole('table', { name: 'Half-normal plot of effects' });
    for (const [term, effect] of Object.entries(example.computed.effects ?? {}))
      expect(cell(table, term, 'Effect').exact).toBeCloseTo(effect, 9);
    const pse = example.computed.lenth?.PSE;
    expect(pse !== undefined).toBe(withLenth.includes(id));
    if (pse === undefined) return;
    expect(numberIn(screen.getByText('PSE').nextSibling?.textContent ?? '')).toBeCloseTo(pse, 4);
  });
});

describe('the curvature and the logarithms of published experiments', () => {
  it('stand on the page as printed', () => {
    const example = factorialExamples.find((each) => each.id === 'yield-2-2-centre');
    if (!example) throw new RangeError('no example');
    const input = toAnalysisInput(example, { terms: ['A', 'B', 'AB'], curvatureTerm: true });
    render(<ModelFigures model={viewOf(example, input)} {...wording} />);
    const anova = screen.getByRole('table', { name: 'Analysis of variance' });
    expectPublished(cell(anova, 'Curvature', 'Sum of squares'), '0.0027');
    expectPublished(cell(anova, 'Residual', 'Sum of squares'), '0.1720');
    const table = screen.getByRole('table', { name: 'Terms of the model' });
    expectPublished(cell(table, 'A', 'F'), '55.87');
    expect(screen.getByText('Corners minus centers').nextSibling).toHaveTextContent('\u22120.035');
  });

  it('of the drill are those of the source', () => {
    const example = factorialExamples.find((each) => each.id === 'drill-2-4');
    if (!example) throw new RangeError('no example');
    const input = toAnalysisInput(example, { terms: ['B', 'C', 'D'], curvatureTerm: false, scale: 'log' });
    render(<ModelFigures model={viewOf(example, input)} {...wording} />);
    const table = screen.getByRole('table', { name: 'Terms of the model' });
    expectPublished(cell(table, 'B', 'Sum of squares'), '5.345');
    expectPublished(cell(table, 'C', 'Sum of squares'), '1.339');
    expectPublished(cell(table, 'D', 'Sum of squares'), '0.431');
    const anova = screen.getByRole('table', { name: 'Analysis of variance' });
    expectPublished(cell(anova, 'Residual', 'Sum of squares'), '0.173');
    expectPublished(cell(anova, 'Residual', 'Mean square'), '0.014');
  });
});
