import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { publishedTrial } from '../../../../tests/builders/published-trials.ts';
import { type MadeTrial, makeView } from '../../../../tests/builders/verdict-view.ts';
import { formatsFor } from '../../../i18n/format.ts';
import { translatorFor } from '../../../i18n/translator.ts';
import { VerdictBody } from './VerdictBody.tsx';

// Published experiments, entered as trials of a shop; the files in tests/fixtures/reference/open name their sources. What
// the source's author concluded stands beside what the page must say, or why it says less.

/** The words of the page as the server sends it, without scripts, one line a block. */
function read(trial: MadeTrial): string {
  const wording = { view: makeView(trial), t: translatorFor('en'), formats: formatsFor('en', 'UTC') };
  return renderToStaticMarkup(<VerdictBody {...wording} />)
    .replace(/<svg.*?<\/svg>/gs, ' ')
    .replace(/<\/?(?:p|h1|h2|li|div|dt|dd|tr|td|th|section|blockquote)[^>]*>/g, '\n')
    .replace(/<[^>]+>/g, '')
    .replaceAll('&#x27;', "'")
    .replace(/\n\s*\n+/g, '\n');
}

const etch = (change?: Parameters<typeof publishedTrial>[2]) =>
  publishedTrial('plasma-etch-2-3', { worthHaving: 50 }, change);

describe('what the page says of published experiments', () => {
  it('strong effects: gap and power and the two together; the flow of the gas does little', () => {
    const page = read(etch());
    expect(page).toContain('Set Pressure to 20 bar and Mix to 20 %.');
    expect(page).toContain('Heat: Clear. Mix: Clear. Heat and Mix together: Clear.');
    expect(page).toContain('Pressure has no clear effect. Its value is a best guess.');
    expect(page).toContain('Heat stays at 10 °C.');
  });

  it('an interaction that reverses a main effect: the other catalyst is worse cold and better hot', () => {
    const page = read(publishedTrial('pilot-plant-2-3-duplicated', { worthHaving: 3 }));
    expect(page).toContain('Set Heat to 20 °C and Mix to Two.');
    expect(page).toMatch(/Mix: One or Two, with Heat at 10 °C\n8\.5 l\/h lower/);
    expect(page).toMatch(/Mix: One or Two, with Heat at 20 °C\n11\.5 l\/h higher/);
    expect(page).toContain('Depends on Heat.');
    expect(page).toContain('Pressure stays at 10 bar.');
    expect(page).not.toMatch(/One or Two makes no real difference/);
  });

  it('no curvature: the five middles lie on the plane', () => {
    const page = read(publishedTrial('yield-2-2-centre', { worthHaving: 0.6 }));
    expect(page).toContain('Heat: Clear. Pressure: Likely.');
    expect(page).toContain('The middle lies on a straight line.');
  });

  it('curvature: the middle lies off the plane, and which setting bends cannot be told', () => {
    const page = read(publishedTrial('constructed-2-3-blocks-centre-replicates', { worthHaving: 1 }));
    expect(page).toContain('Not a straight line: the middle is 2.8 l/h higher than the ends say.');
    expect(page).toContain('We cannot tell which setting bends.');
    expect(page).toContain('so we only use mixes that were run');
  });

  it('two blocks: the same settings and pairs as without the bad batch', () => {
    const page = read(publishedTrial('filtration-2-4-two-blocks', {}));
    expect(page).toContain(
      'Heat: Clear. Mix: Likely. Stir speed: Clear. Heat and Mix together: Clear. Heat and Stir speed together: Clear.',
    );
    // The gain of these very settings is not sure, though what they rest on is.
    expect(page).toContain('It looks better, but we are not sure yet.');
  });

  it('six blocks: nitrogen is what raises the yield; potash lowers it, and phosphate shows nothing', () => {
    const page = read(publishedTrial('npk-2-3-six-blocks', { worthHaving: 4 }));
    expect(page).toContain('Set Heat to Two.');
    expect(page).toContain('Heat: Clear. Mix: Likely.');
    expect(page).toContain('Pressure stays at One. Mix stays at One.');
  });

  it('nothing at all: no effect is clear; the largest stands out at best', () => {
    const page = read(publishedTrial('isatin-2-4', { worthHaving: 0.1 }));
    expect(page).toContain('we are not sure yet');
    expect(page).not.toContain('Clear.');
    expect(page).toContain('That is not sure yet.');
  });

  it('a half fraction with ties: names what is tied, and claims nothing that eight runs without repeats cannot carry', () => {
    const page = read(publishedTrial('filtration-2-4-1-half', {}));
    expect(page).toContain('No setting stands out yet, but this is the best guess.');
    expect(page).toContain('Cannot be told apart: Heat and Stir speed together; Pressure and Mix together.');
    expect(page).toContain('We judged the ups and downs from 7 changes.');
    expect(page).not.toContain('Clear.');
  });

  it('a wild reading among repeats: the run is named and measured again before anything else', () => {
    const page = read(etch((reading, _, place) => (place === 5 ? { y: 5 * (reading.y ?? 0) } : reading)));
    expect(page).toContain('One reading looks odd: run 6 read 3,750 l/h.');
    expect(page).toContain('First measure run 6 again.');
    expect(page).toContain('First we will measure run 6 again.');
    expect(page).not.toContain('Clear.');
  });

  it('rejects out of lots: fewer with the one setting that was built to lower them', () => {
    const page = read(
      publishedTrial('constructed-defectives-2-4-1', {
        kind: 'rejects',
        unit: '',
        lotSize: 50,
        goal: 'less',
        usualRate: 0.2,
        worthHaving: 0.1,
      }),
    );
    expect(page).toContain('Heat: Likely.');
    expect(page).toMatch(/Flow may go from about 9 in 50 to about 3 in 50\./);
    expect(page).toContain('We judged the ups and downs from the counts.');
  });

  it('a failed corner: stays away, names its cause, judges no single setting', () => {
    const page = read(
      etch((reading, x) => (x[0] === 1 && x[2] === 1 ? { y: null, end: 'failed' } : reading)),
    );
    expect(page).toContain('4 runs could not be made or measured. Stay away from those settings.');
    expect(page).toContain('What failed had Heat at 20 °C and Mix at 20 %.');
    expect(page).toContain('Some runs failed. So we judge no single setting here.');
    expect(page).toContain('Heat stays at 10 °C.');
    expect(page).toContain('Try again with a narrower range for Heat and Mix.');
  });
});
