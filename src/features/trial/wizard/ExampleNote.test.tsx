import { screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { renderInWizard } from '../../../../tests/builders/in-wizard.tsx';
import { translatorFor } from '../../../i18n/translator.ts';
import type { Answers } from '../answers.schema.ts';
import type { StarterWords } from '../starters/starter.ts';
import { starterAnswers } from '../starters.ts';
import { ExampleNote } from './ExampleNote.tsx';

const t = translatorFor('en') as (key: string) => string;
const sealing = starterAnswers('sealing', ((key: string) => t(`starters:${key}`)) as StarterWords);
const begun: Answers = { ...sealing, job: { ...sealing.job, starter: 'sealing' } };
const words = 'These are examples. Change them to fit your machine.';

function renderNote(answers: Answers) {
  renderInWizard(<ExampleNote step="settings" />, { answers, namespaces: ['starters'], soFar: 'worked out' });
}

describe('the note on examples', () => {
  it('stands above what a starter filled in', () => {
    renderNote(begun);
    expect(screen.getByText(words)).toBeInTheDocument();
  });

  it('goes once the settings are the shop’s own, and never comes without a starter', () => {
    const [first, ...others] = begun.settings?.settings ?? [];
    if (!first) throw new RangeError('the starter has no settings');
    renderNote({ ...begun, settings: { settings: [{ ...first, high: '170' } as typeof first, ...others] } });
    renderNote({ settings: begun.settings, job: {} });
    expect(screen.queryByText(words)).toBeNull();
  });
});
