import { useTranslation } from 'react-i18next';
import { formatsFor } from '../../../i18n/format.ts';
import { type Language, languageNames, languages } from '../../../i18n/languages.ts';
import { countRuledOut } from '../wizard/safety/ruled-out.ts';
import { mixParts, panelNameOf, usualValueOf } from '../wizard/setting-words.ts';
import { Lines } from './Lines.tsx';
import { ReviewLine } from './ReviewLine.tsx';
import { ReviewPart } from './ReviewPart.tsx';
import { useReview } from './review-context.tsx';

/** All that was said about what can hurt, when to stop, whom to call and the way back. */
export function SafetyReviewPart() {
  const { t } = useTranslation('plan-review');
  return (
    <ReviewPart title={t('part.safety')}>
      <HazardLines />
      <StopAndCallLines />
      <MixAndPartsLines />
    </ReviewPart>
  );
}

function HazardLines() {
  const { t, i18n } = useTranslation('plan-review');
  const { t: tSafety } = useTranslation('safety');
  const { answers, shop } = useReview();
  const { list } = formatsFor(i18n.language as Language, shop.timeZone);
  const { hazards } = answers;
  if (!hazards || hazards.ticked.length === 0) {
    return (
      <ReviewLine label={t('line.hazards')} place="#/hazards">
        <Lines of={hazards?.none ? [t('noHazard')] : []} />
      </ReviewLine>
    );
  }
  return hazards.ticked.map(({ hazard, cautions, protects }, place) => {
    const name = tSafety(`hazard.${hazard}`);
    const words = list(cautions.map((caution) => tSafety(`caution.${caution}`)));
    const inPlace =
      cautions.length > 0
        ? t('inPlace', { hazard: name, cautions: words })
        : t('noneInPlace', { hazard: name });
    const own = protects?.trim() ? [t('protects', { words: protects.trim() })] : [];
    return (
      <ReviewLine key={hazard} label={t('line.hazards')} place={`#/hazards/ticked/${place}`}>
        <Lines of={[inPlace, ...own]} />
      </ReviewLine>
    );
  });
}

function StopAndCallLines() {
  const { t } = useTranslation('plan-review');
  const { t: tSafety } = useTranslation('safety');
  const { answers } = useReview();
  const { stop, call } = answers;
  const own = languages.flatMap((language) => {
    const words = stop?.own?.[language]?.trim();
    return words ? `${languageNames[language]}: ${words}` : [];
  });
  const whom = call?.lines.map(({ when, whom: who }) => [when, who].filter(Boolean).join(': ')) ?? [];
  return (
    <>
      <ReviewLine label={t('line.stop')} place="#/stop">
        <Lines of={[...(stop?.picked.map((rule) => tSafety(`stop.${rule}`)) ?? []), ...own]} />
      </ReviewLine>
      <ReviewLine label={t('line.call')} place="#/call">
        <Lines of={whom} />
      </ReviewLine>
    </>
  );
}

function MixAndPartsLines() {
  const { t, i18n } = useTranslation('plan-review');
  const { t: tWizard } = useTranslation('wizard-safety');
  const { answers, shop } = useReview();
  const { list } = formatsFor(i18n.language as Language, shop.timeZone);
  const settings = answers.settings?.settings ?? [];
  const mixes = answers.neverRun?.mixes.flatMap((mix) => {
    const counted = countRuledOut(mix, settings);
    const ends = Object.fromEntries(mix.parts.map(({ setting, end }) => [setting, end]));
    if (!counted) return [];
    const words = list(mixParts(ends, settings));
    return t('rulesOut', { mix: words, count: counted.ruledOut, total: counted.corners });
  });
  const { fate, label } = answers.parts ?? {};
  const goBack = settings.map((setting) =>
    `${panelNameOf(setting)} ${usualValueOf(setting) ?? tWizard('safety.unknown')}`.trim(),
  );
  return (
    <>
      <ReviewLine label={t('line.neverRun')} place="#/neverRun">
        <Lines of={mixes ?? []} />
      </ReviewLine>
      <ReviewLine label={t('line.parts')} place="#/parts">
        <Lines of={[...(fate ? [tWizard(`safety.fate.${fate}`)] : []), ...(label?.trim() ? [label] : [])]} />
      </ReviewLine>
      <ReviewLine label={t('line.goBack')} place="#/settings">
        <Lines of={goBack.length > 0 ? [list(goBack)] : []} />
      </ReviewLine>
    </>
  );
}
