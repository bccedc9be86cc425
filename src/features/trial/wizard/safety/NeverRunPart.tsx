import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Callout } from '../../../../components/ui/Callout.tsx';
import { QuestionPart } from '../QuestionPart.tsx';
import { panelNameOf } from '../setting-words.ts';
import { useAnswer } from '../use-answer.tsx';
import { useWizard } from '../wizard-context.ts';
import { type Mix, NeverRunMix } from './NeverRunMix.tsx';
import { leavesNothing } from './ruled-out.ts';

const mostMixes = 12;

/** Mixes that must never be run, built by picking settings and their ends. */
export function NeverRunPart() {
  const { t } = useTranslation('wizard-safety');
  const { answers } = useWizard();
  const { content, set, errorAt, section, mayWrite } = useAnswer('neverRun');
  const settings = (answers.settings?.settings ?? []).filter((setting) => panelNameOf(setting) !== '');
  const { mixes } = content;
  const allGone = leavesNothing(mixes, settings);

  function replace(mix: Mix, next: Mix | null): void {
    set({ mixes: mixes.flatMap((each) => (each === mix ? (next ?? []) : each)) });
  }
  function add(): void {
    const id = crypto.randomUUID();
    const parts = settings.slice(0, 2).map((setting) => ({ setting: setting.id, end: 'high' as const }));
    set({ mixes: [...mixes, { id, parts }] });
    requestAnimationFrame(() => document.getElementById(`mix-${id}-0-setting`)?.focus());
  }

  return (
    <QuestionPart title={t('safety.neverRun')} help={t('safety.neverRunHelp')}>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-6" {...section}>
        {mixes.map((mix, place) => (
          <NeverRunMix
            key={mix.id}
            mix={mix}
            place={place}
            settings={settings}
            errorAt={errorAt}
            onChange={(next) => replace(mix, next)}
            onRemove={mayWrite ? () => replace(mix, null) : undefined}
          />
        ))}
        <div role="status" className="empty:hidden">
          {allGone && <Callout tone="caution">{t('safety.allGone')}</Callout>}
        </div>
        {mixes.length === 0 && (
          <p className="text-steel">
            {settings.length < 2 ? t('safety.neverRunFirst') : t('safety.neverRunNone')}
          </p>
        )}
        {settings.length >= 2 && mixes.length < mostMixes && mayWrite && (
          <div>
            <Button icon="plus" onClick={add}>
              {t('safety.addMix')}
            </Button>
          </div>
        )}
      </div>
    </QuestionPart>
  );
}
