import { useTranslation } from 'react-i18next';
import { Icon, type IconName } from '../../components/ui/Icon.tsx';
import { type CheckFinding, checkSteps, type TextsCheck } from './texts-check.schema.ts';

const icons = { waiting: 'wait', good: 'good', bad: 'caution' } as const satisfies Record<
  CheckFinding['state'],
  IconName
>;
const colors = { waiting: 'text-steel', good: 'text-good', bad: 'text-caution' } as const;

/** Each step with a tick, a wait or a sentence that says what is wrong. */
export function CheckSteps({ check }: { readonly check: TextsCheck }) {
  const { t } = useTranslation('shop');
  return (
    <ol className="grid gap-4" aria-live="polite">
      {checkSteps.map((step) => {
        const { state, why } = check.steps[step];
        return (
          <li key={step} className="flex gap-3">
            <span className={colors[state]}>
              <Icon name={icons[state]} />
            </span>
            <div>
              <p>
                <strong>{t(`check.step.${step}`)}</strong>{' '}
                <span className="text-steel">({t(`check.state.${state}`)})</span>
              </p>
              {why && <p>{t(`check.why.${why}`, { code: check.code ?? '', url: check.webhook })}</p>}
            </div>
          </li>
        );
      })}
    </ol>
  );
}
