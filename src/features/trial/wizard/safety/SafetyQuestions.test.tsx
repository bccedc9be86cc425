import { act, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { finishedAnswers } from '../../../../../tests/builders/answers.ts';
import { crewMember, renderInWizard, wizardShop } from '../../../../../tests/builders/in-wizard.tsx';
import { SafetyQuestions } from './SafetyQuestions.tsx';

const { settings } = finishedAnswers();

function box(name: string): HTMLElement {
  return screen.getByRole('checkbox', { name });
}

describe('what can hurt someone', () => {
  it('opens the usual cautions of what is ticked, and says that no guard is taken off', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />);
    expect(screen.queryByText('Never take off or bypass a guard to reach a setting.')).toBeNull();
    await userEvent.click(box('Hot parts'));
    const cautions = screen.getByRole('region', { name: 'Hot parts' });
    await userEvent.click(within(cautions).getByRole('checkbox', { name: 'Guards are closed' }));
    await userEvent.type(within(cautions).getByRole('textbox'), 'Screen at the jaws');
    expect(answers().hazards).toEqual({
      ticked: [{ hazard: 'hotParts', cautions: ['guardsClosed'], protects: 'Screen at the jaws' }],
    });
    expect(screen.getByText('Never take off or bypass a guard to reach a setting.')).toBeVisible();
  });

  it('takes "none of these" as a statement that no hazard stands beside', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />);
    await userEvent.click(box('Hot parts'));
    await userEvent.click(box('None of these'));
    expect(answers().hazards).toEqual({ none: true, ticked: [] });
    expect(box('Hot parts')).not.toBeChecked();
    await userEvent.click(box('Pressure'));
    expect(answers().hazards).toEqual({ ticked: [{ hazard: 'pressure', cautions: [] }] });
    expect(box('None of these')).not.toBeChecked();
  });

  it('keeps the words of a hazard that was ticked off by accident', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />);
    await userEvent.click(box('Lifting'));
    await userEvent.type(screen.getByRole('textbox', { name: /What protects people here/ }), 'Hoist');
    await userEvent.click(box('Lifting'));
    await userEvent.click(box('Lifting'));
    expect(answers().hazards?.ticked).toEqual([{ hazard: 'lifting', cautions: [], protects: 'Hoist' }]);
  });

  it('says at the check what is missing, the first with the focus', async () => {
    const { check } = renderInWizard(<SafetyQuestions />);
    await act(check);
    expect(screen.getByText('Tick what can hurt someone, or tick none of these.')).toBeVisible();
    expect(screen.getAllByText('Please fill this in.').length).toBeGreaterThan(1);
    await act(() => new Promise((done) => requestAnimationFrame(() => done(undefined))));
    expect(box('Hot parts')).toHaveFocus();
  });
});

describe('when to stop', () => {
  const shop = wizardShop({
    people: [
      crewMember({ id: 'ana' }),
      crewMember({ id: 'marek', language: 'pl' }),
      crewMember({ id: 'minh', language: 'vi' }),
      crewMember({ id: 'eva', language: 'es', roles: ['engineer'] }),
    ],
  });

  it('asks for own words in each language of who could run, and names what is missing', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />, { shop });
    await userEvent.click(box('Smoke or a burnt smell'));
    expect(screen.queryByRole('textbox', { name: 'Polski' })).toBeNull();
    await userEvent.type(screen.getByRole('textbox', { name: 'English' }), 'Film tears');
    expect(screen.getByText('Your own words also need: Polish and Vietnamese')).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Add now' }));
    await userEvent.keyboard('Folia pęka');
    expect(screen.getByText('Your own words also need: Vietnamese')).toBeVisible();
    expect(screen.queryByRole('textbox', { name: 'Español' })).toBeNull();
    expect(answers().stop).toEqual({ picked: ['smoke'], own: { en: 'Film tears', pl: 'Folia pęka' } });
  });

  it('asks only for the languages of the crew once it is named', async () => {
    const crew = { shifts: [{ id: 'night', runs: 'minh', measures: 'ana' }] };
    renderInWizard(<SafetyQuestions />, { shop, answers: { crew } });
    await userEvent.type(screen.getByRole('textbox', { name: 'English' }), 'Film tears');
    expect(screen.getByText('Your own words also need: Vietnamese')).toBeVisible();
  });
});

describe('whom to call', () => {
  it('keeps the first line once something is typed, and takes more', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />);
    expect(answers().call).toBeUndefined();
    await userEvent.type(screen.getByRole('textbox', { name: 'Name and number' }), 'Dana');
    await userEvent.click(screen.getByRole('button', { name: 'Add a shift' }));
    await act(() => new Promise((done) => requestAnimationFrame(() => done(undefined))));
    await userEvent.keyboard('night');
    const [first, second] = answers().call?.lines ?? [];
    expect(first).toMatchObject({ whom: 'Dana' });
    expect(second).toMatchObject({ when: 'night' });
    await userEvent.click(screen.getByRole('button', { name: 'Remove Line 1' }));
    expect(answers().call?.lines).toEqual([second]);
  });
});

describe('mixes that are never run', () => {
  it('are built by picking, and say how many mixes they rule out', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />, { answers: { settings } });
    await userEvent.click(screen.getByRole('button', { name: 'Add a mix' }));
    const mix = screen.getByRole('group', { name: 'Mix 1' });
    expect(within(mix).getByRole('status')).toHaveTextContent('This rules out 2 of 8 mixes.');
    await userEvent.selectOptions(within(mix).getByRole('combobox', { name: 'Setting 2' }), 'Film');
    const [, end] = within(mix).getAllByRole('combobox', { name: 'Its side' });
    if (!end) throw new Error('the mix has no second end');
    // A choice is named by its own words, never as low or high.
    expect(
      within(end)
        .getAllByRole('option')
        .map(({ textContent }) => textContent),
    ).toEqual(['Supplier A', 'Supplier B']);
    await userEvent.selectOptions(end, 'Supplier A');
    await userEvent.click(within(mix).getByRole('button', { name: 'Add a setting to this mix' }));
    expect(within(mix).getByRole('status')).toHaveTextContent('This rules out 1 of 8 mixes.');
    expect(answers().neverRun?.mixes[0]?.parts).toEqual([
      { setting: 'temp', end: 'high' },
      { setting: 'film', end: 'low' },
      { setting: 'dwell', end: 'high' },
    ]);
  });

  it('name a setting that is there no more', () => {
    const parts = [
      { setting: 'temp', end: 'high' as const },
      { setting: 'gone', end: 'low' as const },
    ];
    renderInWizard(<SafetyQuestions />, { answers: { settings, neverRun: { mixes: [{ id: 'a', parts }] } } });
    expect(screen.getByText(/A setting of this mix is there no more/)).toBeVisible();
    expect(screen.queryByText(/This rules out/)).toBeNull();
  });

  it('may not take everything away', () => {
    const ends = ['low', 'high'] as const;
    const mixes = ends.flatMap((one) =>
      ends.map((other) => ({
        id: `${one} ${other}`,
        parts: [
          { setting: 'temp', end: one },
          { setting: 'dwell', end: other },
        ],
      })),
    );
    renderInWizard(<SafetyQuestions />, { answers: { settings, neverRun: { mixes } } });
    expect(screen.getByText('These mixes leave nothing to run. Remove one.')).toBeVisible();
  });
});

describe('parts and the way back', () => {
  it('say what becomes of the parts and what each setting goes back to', async () => {
    const { answers } = renderInWizard(<SafetyQuestions />, { answers: { settings } });
    await userEvent.click(screen.getByRole('radio', { name: 'Mark, hold and check' }));
    await userEvent.type(screen.getByRole('textbox', { name: /What to write on them/ }), 'HOLD');
    expect(answers().parts).toEqual({ fate: 'hold', label: 'HOLD' });
    const back = screen.getByRole('region', { name: 'When the trial ends or stops, set back to' });
    expect(
      within(back)
        .getAllByRole('definition')
        .map(({ textContent }) => textContent),
    ).toEqual(['150 C', '.8 s', 'Supplier A']);
  });

  it('can only be looked at by whoever may not change them', () => {
    renderInWizard(<SafetyQuestions />, { answers: finishedAnswers(), mayWrite: false });
    for (const field of screen.getAllByRole('checkbox')) expect(field).toBeDisabled();
    expect(screen.queryByRole('button', { name: 'Add a mix' })).toBeNull();
  });
});
