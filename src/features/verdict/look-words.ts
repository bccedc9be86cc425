import type { Look } from '../../lib/doe/index.ts';
import { resultWords } from './result-words.ts';
import { sayRange } from './setting-words.ts';
import { capitalize, type Wording } from './wording.ts';

/** What is said of settings that somebody tries: the expected results with their ranges, or why nothing can be said. */
export function sayLook(look: Look, wording: Wording): { tone: 'info' | 'caution'; lines: string[] } {
  const { t, view } = wording;
  if (look.refused === 'outside') {
    const factor = view.brief.factors[look.place];
    const range = factor?.kind === 'number' ? sayRange(wording, factor) : '';
    const setting = view.panelNames[look.place] ?? '';
    return { tone: 'caution', lines: [t('verdict-page:try.outside', { setting, range })] };
  }
  if (look.refused !== null) return { tone: 'caution', lines: [t(`verdict-page:try.${look.refused}`)] };
  const lines = look.outlooks.map(({ result, predicted, interval }) => {
    const { figure, range, spec } = resultWords(wording, result);
    return t('verdict-page:try.expected', {
      result: capitalize(spec.name),
      figure: figure(predicted, { interval }),
      range: range(interval),
    });
  });
  return look.isRough
    ? { tone: 'caution', lines: [...lines, t('verdict-page:try.off')] }
    : { tone: 'info', lines };
}
