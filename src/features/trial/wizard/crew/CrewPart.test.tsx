import { fireEvent, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { renderInWizard, wizardShop } from '../../../../../tests/builders/in-wizard.tsx';
import type { CrewMember } from '../wizard-context.ts';
import { CrewPart } from './CrewPart.tsx';

const person = (id: string, name: string, more: Partial<CrewMember> = {}): CrewMember => ({
  id,
  kind: 'person',
  name,
  language: 'en',
  roles: ['operator'],
  safetyPerson: false,
  consent: 'agreed',
  consentAt: Date.UTC(2026, 2, 3, 12),
  textingHours: ['Mon–Fri 06:00–14:00'],
  ...more,
});
const people = [
  person('ana', 'Ana Ruiz', { language: 'es' }),
  person('minh', 'Minh Trần', { language: 'vi', consent: 'asked', consentAt: null }),
  person('dana', 'Dana Holt', { roles: ['supervisor'] }),
];

afterEach(() => vi.unstubAllGlobals());

function renderCrew(crew: readonly CrewMember[] = people) {
  return renderInWizard(<CrewPart />, {
    namespaces: ['wizard-plan', 'trials'],
    soFar: 'worked out',
    shop: wizardShop({ people: crew }),
  });
}

describe('the crew', () => {
  beforeEach(() => vi.stubGlobal('fetch', vi.fn()));

  it('is said shift by shift, and each person’s way is asked once', async () => {
    const told = renderCrew();
    await userEvent.click(screen.getByRole('button', { name: 'Add a shift' }));
    await userEvent.type(screen.getByRole('textbox', { name: 'Shift' }), 'Day');
    await userEvent.tab();
    expect(screen.queryByText('Please fill this in.')).toBeNull();
    const runs = screen.getByRole('combobox', { name: 'Who runs?' });
    fireEvent.change(runs, { target: { value: 'ana' } });
    expect(screen.queryByText('Please fill this in.')).toBeNull();
    const way = screen.getByRole('group', { name: /Ana Ruiz/ });
    await userEvent.click(within(way).getByRole('radio', { name: 'Text' }));
    expect(screen.getByText('Ana Ruiz said yes to texts on Mar 3, 2026.')).toBeInTheDocument();
    expect(told.answers().crew).toMatchObject({
      shifts: [{ name: 'Day', runs: 'ana' }],
      ways: { ana: 'text' },
    });
  });

  it('offers paper to whoever has not said yes, as good as texts', async () => {
    const told = renderCrew();
    await userEvent.click(screen.getByRole('button', { name: 'Add a shift' }));
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Who runs?' }), 'Minh Trần');
    await userEvent.click(screen.getByRole('radio', { name: 'Text' }));
    expect(screen.getByText('Minh Trần has not said yes yet.')).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Ask again' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Use paper' }));
    expect(told.answers().crew?.ways).toEqual({ minh: 'paper' });
    expect(screen.queryByRole('button', { name: 'Ask again' })).toBeNull();
  });

  it('leads to the people where nobody runs a machine yet', () => {
    renderCrew([people[2] as CrewMember]);
    expect(screen.getByRole('link', { name: 'Add a person' })).toHaveAttribute('href', '/people/new');
  });

  it('offers a line phone only where the shop has one', async () => {
    renderCrew([...people, person('phone', 'Line 3 phone', { kind: 'line phone' })]);
    await userEvent.click(screen.getByRole('button', { name: 'Add a shift' }));
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Who runs?' }), 'Line 3 phone');
    const way = screen.getByRole('group', { name: /Line 3 phone/ });
    expect(within(way).getAllByRole('radio')).toHaveLength(2);
  });
});
