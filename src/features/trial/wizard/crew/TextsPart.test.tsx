import { configure, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { renderInWizard } from '../../../../../tests/builders/in-wizard.tsx';
import type { Practice, TextsPreview } from '../../texts-preview.schema.ts';
import { TextsPart } from './TextsPart.tsx';

// A machine that does other work besides must not fail a test for being slow.
configure({ asyncUtilTimeout: 15_000 });
afterEach(() => vi.unstubAllGlobals());

const text = { units: 164, sevenBit: true, segments: 2, tooLong: null };
const preview: TextsPreview = {
  texts: [
    { ...text, language: 'es', body: 'Line 3, corrida 1 de 11' },
    {
      ...text,
      language: 'vi',
      body: 'Line 3, lượt 1 / 11',
      sevenBit: false,
      tooLong: { name: 'PRESSURE OF THE JAW', letters: 7 },
    },
  ],
  whole: { texts: 34, segments: 60 },
};

function renderTexts(answer: TextsPreview, outcome: Practice['outcome'] = 'queued') {
  vi.stubGlobal('fetch', async (_: string, call: { method: string }) =>
    Response.json(call.method === 'POST' ? { outcome } : answer),
  );
  renderInWizard(<TextsPart />, { namespaces: ['wizard-plan', 'trials'], soFar: 'worked out' });
}

describe('the text that the crew gets', () => {
  it('is shown in each language with its length, and says which name is too long', async () => {
    renderTexts(preview);
    expect(await screen.findByText('Line 3, corrida 1 de 11')).toHaveAttribute('lang', 'es');
    expect(screen.getByText('164 letters without accents, 2 text parts.')).toBeInTheDocument();
    expect(screen.getByText(/about 34 texts, 60 text parts/)).toBeInTheDocument();
    await userEvent.click(screen.getByRole('radio', { name: 'Tiếng Việt' }));
    expect(screen.getByText('Line 3, lượt 1 / 11')).toBeInTheDocument();
    expect(screen.getByText(/Make “PRESSURE OF THE JAW” 7 letters shorter/)).toBeInTheDocument();
  });

  it('waits for a plan and leads to it', async () => {
    renderTexts({ texts: [], whole: null });
    const link = await screen.findByRole('link', { name: 'Pick a plan' });
    expect(link.getAttribute('href')).toMatch(/\/plan$/);
  });

  it.each([
    ['queued', 'It is on its way to your phone.'],
    ['no consent', 'You have not said yes to texts yet. Answer OK to the question on your phone.'],
  ] as const)('goes to one’s own phone as practice, or says why not (%s)', async (outcome, words) => {
    renderTexts(preview, outcome);
    await userEvent.click(await screen.findByRole('button', { name: 'Send run 1 to my phone' }));
    expect(await screen.findByText(words)).toBeInTheDocument();
  });
});
