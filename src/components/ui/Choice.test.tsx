import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Checkbox } from './Checkbox.tsx';
import { Choice } from './Choice.tsx';

const options = [
  { value: 'higher', label: 'higher' },
  { value: 'lower', label: 'lower', help: 'Less is better.' },
  { value: 'target', label: 'close to one value', disabled: true },
];

function Controlled({ onPick }: { onPick: (value: string) => void }) {
  const [value, setValue] = useState('higher');
  return (
    <Choice
      id="want"
      name="want"
      legend="I want it"
      options={options}
      shape="cards"
      value={value}
      onChange={(event) => {
        onPick(event.target.value);
        setValue(event.target.value);
      }}
    />
  );
}

describe('Choice', () => {
  it('is one group with a question, help and error', () => {
    render(
      <Choice
        id="want"
        name="want"
        legend="I want it"
        options={options}
        help="Pick one."
        error="Pick one first."
      />,
    );
    const group = screen.getByRole('group', { name: 'I want it' });
    expect(group).toHaveAccessibleDescription('Pick one. Pick one first.');
    expect(screen.getAllByRole('radio')).toHaveLength(3);
  });

  it('is moved through by arrow keys and skips what cannot be chosen', async () => {
    render(<Choice id="want" name="want" legend="I want it" options={options} defaultValue="higher" />);
    await userEvent.tab();
    expect(screen.getByRole('radio', { name: 'higher' })).toHaveFocus();
    await userEvent.keyboard('{ArrowDown}');
    expect(screen.getByRole('radio', { name: /lower/ })).toBeChecked();
    expect(screen.getByRole('radio', { name: 'close to one value' })).toBeDisabled();
  });

  it('takes several where it says so, marked with their hazard', async () => {
    const hazards = [
      { value: 'hot', label: 'Hot parts', hazard: 'hot' as const },
      { value: 'noise', label: 'Loud noise', hazard: 'noise' as const },
    ];
    render(
      <Choice
        id="hurt"
        name="hurt"
        legend="What can hurt?"
        options={hazards}
        several
        defaultValue={['hot']}
      />,
    );
    await userEvent.click(screen.getByRole('checkbox', { name: 'Loud noise' }));
    expect(screen.getByRole('checkbox', { name: 'Hot parts' })).toBeChecked();
    expect(screen.getByRole('checkbox', { name: 'Loud noise' })).toBeChecked();
  });

  it('follows a value from outside and hands its events out', async () => {
    const changes = vi.fn();
    render(<Controlled onPick={changes} />);
    await userEvent.click(screen.getByRole('radio', { name: /lower/ }));
    expect(changes).toHaveBeenCalledWith('lower');
    expect(screen.getByRole('radio', { name: 'higher' })).not.toBeChecked();
  });
});

describe('Checkbox', () => {
  it('is ticked by its words and by Space, with help and error', async () => {
    render(<Checkbox id="guards" label="Guards are on." help="Look at each." error="Tick this first." />);
    const box = screen.getByRole('checkbox', { name: 'Guards are on.' });
    expect(box).toHaveAccessibleDescription('Look at each. Tick this first.');
    expect(box).toBeInvalid();
    await userEvent.click(screen.getByText('Guards are on.'));
    expect(box).toBeChecked();
    await userEvent.keyboard(' ');
    expect(box).not.toBeChecked();
  });
});
