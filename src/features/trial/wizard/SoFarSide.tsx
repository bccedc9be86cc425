import { useTranslation } from 'react-i18next';
import { Loading } from '../../../components/ui/Loading.tsx';
import type { Language } from '../../../i18n/languages.ts';
import type { WizardStep } from '../questions.ts';
import { SketchRack } from './SketchRack.tsx';
import { SoFarLine } from './SoFarLine.tsx';
import { spotsWords } from './so-far-words.ts';
import type { SoFar, WizardShop } from './wizard-context.ts';
import { addressOf, toDoHash } from './wizard-page.ts';

interface Props {
  readonly soFar: SoFar | null;
  readonly shop: WizardShop;
  readonly toDo: { count: number; first: WizardStep | undefined };
  readonly trialId: string;
  readonly step: WizardStep;
  /** Shows what is missing on this very page. */
  readonly onCheck: () => void;
}

function Plan({ soFar, shop }: { soFar: SoFar; shop: WizardShop }) {
  const { t, i18n } = useTranslation('wizard-frame');
  const { brief, proposals, misfit, missing, runs } = soFar;
  const [best] = proposals;
  if (misfit) return <p>{t('soFar.nothingFitsWords')}</p>;
  if (!best || !brief) return <p>{t('soFar.notEnough', { count: missing })}</p>;
  return (
    <>
      <p className="font-semibold">
        <SoFarLine soFar={soFar} shop={shop} />
      </p>
      <p>{spotsWords(best, brief.response, t, i18n.language as Language)}</p>
      <SketchRack runs={runs} factors={brief.factors} />
    </>
  );
}

/** What the answers mean so far, and what is still to do. */
export function SoFarSide({ soFar, shop, toDo, trialId, step, onCheck }: Props) {
  const { t } = useTranslation('wizard-frame');
  return (
    <div className="grid gap-3">
      <h2>{t('soFar.title')}</h2>
      {soFar ? <Plan soFar={soFar} shop={shop} /> : <Loading label={t('soFar.working')} lines={2} />}
      {toDo.first && (
        <p>
          <a
            className="inline-flex min-h-12 items-center"
            href={`${addressOf(trialId, toDo.first)}${toDoHash}`}
            onClick={toDo.first === step ? onCheck : undefined}
          >
            {t('soFar.toDo', { count: toDo.count })}
          </a>
        </p>
      )}
    </div>
  );
}
