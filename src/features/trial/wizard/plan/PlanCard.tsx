import { useId } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../../components/ui/Button.tsx';
import { Disclosure } from '../../../../components/ui/Disclosure.tsx';
import { Icon, type IconName } from '../../../../components/ui/Icon.tsx';
import { formatsFor } from '../../../../i18n/format.ts';
import type { Language } from '../../../../i18n/languages.ts';
import type { Brief, PlannedRun, Proposal } from '../../../../lib/doe/index.ts';
import { type FactLine, planFactLines } from '../../../plan/fact-words.ts';
import { aboutMoney, aboutTime, sizeOfResult, spotsWords } from '../so-far-words.ts';
import { useWizard } from '../wizard-context.ts';
import { PlanRack } from './PlanRack.tsx';
import { isRecommending, splitFacts, tiedSettings, timesInTen, titleOf } from './plan-card.ts';

interface Props {
  readonly brief: Brief;
  readonly proposal: Proposal;
  /** In an order as it might be; the real one is drawn when the plan is taken. */
  readonly runs: readonly PlannedRun[];
  readonly isTaken: boolean;
  readonly busy: boolean;
  /** Null for a reader who may only look. */
  readonly onTake: (() => void) | null;
}

const icons = { good: 'tick', caution: 'caution', info: 'info' } as const satisfies Record<
  FactLine['tone'],
  IconName
>;
const colors = { good: 'text-good', caution: 'text-caution', info: 'text-steel' } as const;
const mostTies = 3;

function Lines({ lines }: { lines: readonly FactLine[] }) {
  return (
    <ul className="grid gap-1.5">
      {lines.map(({ tone, words }) => (
        <li key={words} className="grid grid-cols-[auto_minmax(0,1fr)] gap-2">
          <span className={`${colors[tone]} flex h-7 items-center`}>
            <Icon name={icons[tone]} size={20} />
          </span>
          <span>{words}</span>
        </li>
      ))}
    </ul>
  );
}

/** One plan: its runs, what it takes, what it would most likely spot, and what it cannot tell apart. */
export function PlanCard({ brief, proposal, runs, isTaken, busy, onTake }: Props) {
  const { t, i18n } = useTranslation('wizard-plan');
  const { t: tFacts } = useTranslation('plan-facts');
  const { t: tFrame } = useTranslation('wizard-frame');
  const { shop, soFar } = useWizard();
  const id = useId();
  const language = i18n.language as Language;
  const { number, list } = formatsFor(language, 'UTC');
  const { response, factors } = brief;
  const nameOf = (letter: string) => factors[letter.charCodeAt(0) - 65]?.name ?? '';

  const takes = [
    tFrame('soFar.runs', { count: proposal.runs }),
    ...(proposal.minutes === undefined ? [] : [aboutTime(proposal.minutes, tFrame, language)]),
    ...(proposal.cost === undefined
      ? []
      : [tFrame('soFar.about', { what: aboutMoney(proposal.cost, shop.currency, language) })]),
  ].join(' · ');
  const [easy, hard] = proposal.detectable;
  const size = (value: number) => sizeOfResult(value, response, tFrame, language);
  const times = timesInTen(proposal);
  const { worthHaving } = response;
  const { shown, folded } = splitFacts(proposal);
  const write = (facts: typeof shown) => planFactLines(facts, brief, tFacts, language);
  const ties = tiedSettings(proposal);
  const title = t(`plan.card.${titleOf(proposal, soFar.proposals[0])}`);
  const [why] = write(proposal.reasons.filter(isRecommending));

  return (
    <article className={isTaken ? 'sheet plan-card plan-card-taken' : 'sheet plan-card'} aria-labelledby={id}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <h2 id={id}>{title}</h2>
        <p className="font-semibold">{takes}</p>
      </div>
      <PlanRack factors={factors} runs={runs} />
      <div>
        <p className="font-semibold">{spotsWords(proposal, response, tFrame, language)}</p>
        {hard && easy && hard.unit === 'response' && hard.size > easy.size * 1.05 && (
          <p>
            {t('plan.spotsHard', {
              settings: list(factors.filter(({ hardToChange }) => hardToChange).map(({ name }) => name)),
              size: size(hard.size),
            })}
          </p>
        )}
        {times !== null && worthHaving !== undefined && (
          <p>
            {times === 0
              ? t('plan.gainHardlyFound', { size: size(worthHaving) })
              : t('plan.gainFound', { size: size(worthHaving), times: number(times) })}
          </p>
        )}
      </div>
      {ties.length > 0 && (
        <ul className="grid gap-1">
          {ties.slice(0, mostTies).map(({ letter, others }) => (
            <li key={letter}>
              {t('plan.cannotTell', {
                setting: nameOf(letter),
                others: list(others.map((pair) => [...pair].map(nameOf).join(' + '))),
              })}
            </li>
          ))}
          {ties.length > mostTies && <li>{t('plan.moreTies', { count: ties.length - mostTies })}</li>}
        </ul>
      )}
      <Lines lines={write(shown)} />
      {why && <p>{t('plan.why', { reason: why.words })}</p>}
      {folded.length > 0 && (
        <Disclosure summary={t('plan.details')}>
          <Lines lines={write(folded)} />
        </Disclosure>
      )}
      {isTaken ? (
        <p className="flex items-center gap-2 font-semibold text-good">
          <Icon name="good" />
          {t('plan.taken')}
        </p>
      ) : (
        onTake && (
          <div className="button-row">
            <Button
              kind={proposal.recommended ? 'primary' : 'secondary'}
              busy={busy}
              busyLabel={t('plan.taking')}
              aria-describedby={id}
              onClick={onTake}
            >
              {t('plan.take')}
            </Button>
          </div>
        )
      )}
    </article>
  );
}
