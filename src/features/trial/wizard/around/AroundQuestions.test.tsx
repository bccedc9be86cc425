import { act, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { renderInWizard } from '../../../../../tests/builders/in-wizard.tsx';
import { AroundQuestions } from './AroundQuestions.tsx';

function row(name: string): HTMLElement {
  return screen.getByRole('group', { name });
}

function ways(name: string): (string | null)[] {
  return within(row(name))
    .getAllByRole('radio')
    .map((radio) => radio.getAttribute('value'));
}

describe('what may get in the way', () => {
  it('offers for each thing only what may be done about it', () => {
    renderInWizard(<AroundQuestions />);
    expect(ways('Material batch')).toEqual(['same', 'split', 'writeDown', 'noIssue']);
    expect(ways('Gauge or who measures')).toEqual(['same', 'writeDown', 'noIssue']);
    expect(ways('Crew')).toEqual(['same', 'writeDown']);
    expect(row('Crew')).toHaveAccessibleDescription('We never compare people.');
  });

  it('asks how to split, two if nobody says, and what fits', async () => {
    const { answers } = renderInWizard(<AroundQuestions />);
    await userEvent.click(within(row('Shift')).getByRole('radio', { name: 'Split the runs' }));
    expect(screen.getByText(/Then an odd shift cannot fool you/)).toBeVisible();
    expect(within(row('How many shifts?')).getByRole('radio', { name: '2' })).toBeChecked();
    await userEvent.click(within(row('How many shifts?')).getByRole('radio', { name: '4' }));
    await userEvent.type(screen.getByRole('textbox', { name: /Most runs that fit in one shift/ }), '6');
    expect(answers().around?.shift).toEqual({ way: 'split', count: '4', runsEach: '6' });
  });

  it('takes things of one’s own, which cannot be split', async () => {
    const { answers } = renderInWizard(<AroundQuestions />);
    await userEvent.click(screen.getByRole('button', { name: 'Add your own' }));
    await act(() => new Promise((done) => requestAnimationFrame(() => done(undefined))));
    await userEvent.keyboard('Door open');
    await userEvent.click(
      within(row('What do you do about it?')).getByRole('radio', { name: 'Keep the same' }),
    );
    expect(ways('What do you do about it?')).not.toContain('split');
    expect(answers().around?.own).toMatchObject([{ name: 'Door open', way: 'same' }]);
    await userEvent.click(screen.getByRole('button', { name: 'Remove Door open' }));
    expect(answers().around?.own).toEqual([]);
  });

  it('says at the check which rows are open, and that only one thing can split the runs', async () => {
    const split = { way: 'split' } as const;
    const { check } = renderInWizard(<AroundQuestions />, {
      answers: { around: { batch: split, machine: split } },
    });
    expect(screen.queryByText('Pick one of the choices.')).toBeNull();
    const onlyOne = 'The runs can be split by one thing only. Keep the other the same.';
    expect(row('Machine or lane')).toHaveAccessibleDescription(onlyOne);
    await act(check);
    expect(row('Shift')).toHaveAccessibleDescription('Pick one of the choices.');
    expect(row('Material batch')).not.toHaveAccessibleDescription('Pick one of the choices.');
  });
});
