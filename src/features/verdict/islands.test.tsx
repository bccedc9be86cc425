import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { resultsOf, trialOf, verdictCase } from '../../../tests/builders/verdict-cases.ts';
import { wordsFor } from '../../i18n/resources.ts';
import { DecideForm } from './DecideForm.tsx';
import { TrySettings } from './TrySettings.tsx';

afterEach(() => vi.unstubAllGlobals());

const said = () => document.querySelector('.callout')?.textContent ?? '';

describe('TrySettings', () => {
  const view = verdictCase('strong');
  const show = () =>
    render(
      <TrySettings
        language="en"
        words={wordsFor('en', ['verdict', 'verdict-page'])}
        view={{ ...view, runs: [] }}
        results={resultsOf(trialOf('strong'))}
        start={view.bet.actual}
      />,
    );

  it('starts at the settings to try, with the figure of the page', () => {
    show();
    expect(said()).toContain('Seal strength: about 41 N (40 to 43 N)');
  });

  it('follows a slider, and refuses beyond what was tried', () => {
    show();
    const jaw = screen.getByLabelText('JAW TEMP');
    fireEvent.change(jaw, { target: { value: '140' } });
    expect(said()).not.toContain('about 41 N');
    fireEvent.change(jaw, { target: { value: '180' } });
    expect(said()).toBe('JAW TEMP: nothing outside 140 to 160 °C was tried. So we cannot say.');
    fireEvent.click(screen.getByRole('button', { name: 'Back to our proposal' }));
    expect(said()).toContain('about 41 N');
  });
});

describe('DecideForm', () => {
  const show = (held: boolean) =>
    render(
      <DecideForm
        language="en"
        words={wordsFor('en', ['verdict-page', 'people', 'errors'])}
        trialId="0190b6d2-0000-7000-8000-000000000001"
        revision={4}
        held={held}
        hasNew
      />,
    );
  const press = () => fireEvent.click(screen.getByRole('button', { name: 'Decide' }));

  it('asks for a choice, and for a reason before check runs held', () => {
    const fetch = vi.fn();
    vi.stubGlobal('fetch', fetch);
    show(false);
    press();
    expect(screen.getByText('Please choose one.')).toBeInTheDocument();
    fireEvent.click(screen.getByLabelText(/^Use unchecked/));
    press();
    expect(screen.getByText('Please give a reason.')).toBeInTheDocument();
    expect(fetch).not.toHaveBeenCalled();
  });

  it('sends what was decided, and keeps what was typed when there is no connection', async () => {
    const fetch = vi.fn().mockRejectedValue(new TypeError('no network'));
    vi.stubGlobal('fetch', fetch);
    show(true);
    fireEvent.click(screen.getByLabelText('Use the new settings'));
    fireEvent.change(screen.getByLabelText('Note'), { target: { value: 'From Monday on' } });
    press();
    await waitFor(() => expect(screen.getByRole('alert')).toBeInTheDocument());
    expect(JSON.parse(fetch.mock.calls[0]?.[1]?.body)).toEqual({
      event: 'adopt',
      revision: 4,
      unchecked: false,
      note: 'From Monday on',
    });
    expect(screen.getByLabelText('Note')).toHaveValue('From Monday on');
  });
});
