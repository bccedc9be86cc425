import type { TagSetting } from '../../../components/ui/JobTagSettings.tsx';
import { SettingsCard } from '../../../components/ui/SettingsCard.tsx';
import type { FactorSpec } from '../../../lib/doe/index.ts';
import { listDials } from '../headline-words.ts';
import { CallLines, Hazards } from './IfItGoesWrong.tsx';
import { keepsToday, type PageWording } from './page-wording.ts';

function toTagSetting(
  { formats }: PageWording,
  { name, factor, value }: { name: string; factor: FactorSpec | undefined; value: number | string },
): TagSetting {
  const unit = factor?.kind === 'number' ? factor.unit : undefined;
  return { name, value: typeof value === 'number' ? formats.number(value, 6) : value, unit };
}

/** The A5 card for the machine: what to set, where to go back to, whom to call. After a verdict that says "keep", today's settings stand on it. */
export function VerdictCard(wording: PageWording) {
  const { view, t, formats } = wording;
  const values = keepsToday(view) ? view.usual : view.bet.actual;
  const all = view.usual.map((_, place) => place);
  const unchecked = !keepsToday(view) && view.confirmation?.outcome !== 'held';
  return (
    <SettingsCard
      title={view.machine}
      note={t('verdict-page:cardPage.note', {
        number: formats.number(view.number),
        date: formats.date(view.madeAt),
      })}
      settings={all.map((place) =>
        toTagSetting(wording, {
          name: view.panelNames[place] ?? '',
          factor: view.brief.factors[place],
          value: values[place] ?? '',
        }),
      )}
      parts={[
        ...(unchecked ? [{ title: t('verdict-page:cardPage.unchecked'), words: '' }] : []),
        {
          title: t('verdict-page:cardPage.goBack'),
          words: listDials(wording, view.usual, all, 'at'),
        },
        ...(view.hazards.length > 0
          ? [{ title: t('verdict-page:cardPage.care'), words: <Hazards {...wording} /> }]
          : []),
        { title: t('verdict-page:cardPage.call'), words: <CallLines {...wording} /> },
      ]}
      foot={t('verdict-page:cardPage.foot')}
    />
  );
}
