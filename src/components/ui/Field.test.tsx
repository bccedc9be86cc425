import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { createRef } from 'react';
import { describe, expect, it } from 'vitest';
import { NumberInput } from './NumberInput.tsx';
import { Select } from './Select.tsx';
import { TextArea } from './TextArea.tsx';
import { TextInput } from './TextInput.tsx';

const callers = [
  { value: 'dana', label: 'Dana' },
  { value: 'lee', label: 'Lee' },
];

describe('a field', () => {
  it('ties label, help and error to its control', () => {
    render(<TextInput id="machine" label="Machine" help="As the crew calls it." error="Type a name." />);
    const input = screen.getByRole('textbox', { name: 'Machine' });
    expect(input).toHaveAccessibleDescription('As the crew calls it. Type a name.');
    expect(input).toBeInvalid();
  });

  it('names nothing that is not there', () => {
    render(<TextInput id="machine" label="Machine" />);
    const input = screen.getByRole('textbox', { name: 'Machine' });
    expect(input).not.toHaveAttribute('aria-describedby');
    expect(input).not.toHaveAttribute('aria-invalid');
  });

  it('keeps its name when the label is only for screen readers, and says that it may be left out', () => {
    render(<TextArea id="remark" label="Remark" labelHidden mark="(may be left out)" />);
    expect(screen.getByRole('textbox', { name: 'Remark (may be left out)' })).toBeVisible();
  });

  it('hands ref and further props to the control', async () => {
    const ref = createRef<HTMLInputElement>();
    render(<TextInput id="mail" label="E-mail" type="email" autoComplete="email" name="mail" ref={ref} />);
    expect(ref.current).toBe(screen.getByRole('textbox', { name: 'E-mail' }));
    expect(ref.current).toHaveAttribute('type', 'email');
    expect(ref.current).toHaveAttribute('name', 'mail');
  });
});

describe('NumberInput', () => {
  it('opens the number keypad, keeps a decimal comma and reads out its unit', async () => {
    render(<NumberInput id="dwell" label="Dwell" unit="s" error="Too short." />);
    const input = screen.getByRole('textbox', { name: 'Dwell' });
    await userEvent.type(input, '0,85');
    expect(input).toHaveValue('0,85');
    expect(input).toHaveAttribute('inputmode', 'decimal');
    expect(input).toHaveAccessibleDescription('s Too short.');
  });
});

describe('Select', () => {
  it('offers the empty entry first and is chosen by keyboard', async () => {
    render(
      <Select
        id="caller"
        label="Whom to call"
        options={callers}
        emptyLabel="Pick one"
        help="On this shift."
      />,
    );
    const select = screen.getByRole('combobox', { name: 'Whom to call' });
    expect(select).toHaveValue('');
    expect(select).toHaveAccessibleDescription('On this shift.');
    await userEvent.selectOptions(select, 'Lee');
    expect(select).toHaveValue('lee');
  });
});
