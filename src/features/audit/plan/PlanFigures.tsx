import type { TFunction } from 'i18next';
import { auditLines } from '../../trial/review/audit-lines.ts';
import type { AuditPlanView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { AuditPart } from '../frame/AuditPart.tsx';
import { FigureLines } from '../frame/FigureLines.tsx';
import { FigureSources } from '../sources/FigureSources.tsx';
import { FactorTable } from './FactorTable.tsx';
import { PowerTable } from './PowerTable.tsx';
import { RunOrderTable } from './RunOrderTable.tsx';

interface Props extends AuditWording {
  readonly plan: AuditPlanView;
  /** The words of the plan's review: both pages say the same of a plan. */
  readonly tReview: TFunction<'plan-review'>;
}

/** What was planned, in the field's terms. */
export function PlanFigures({ plan, tReview, ...wording }: Props) {
  const { t, formats, figures } = wording;
  const { brief, proposal, checks } = plan;
  const { worthHaving, unit } = brief.response;
  const worth = worthHaving === undefined ? '' : `${figures.one(worthHaving)} ${unit}`.trim();
  const lines = auditLines(proposal, { t: tReview, formats, unit, worth }).map(({ key, label, lines }) => ({
    key,
    label,
    anchor: `plan-${key.replace('/', '-')}`,
    value: lines.map((line) => <p key={line}>{line}</p>),
  }));
  const origin = [
    { key: 'seed', label: t('audit:plan.seed'), value: String(plan.seed) },
    { key: 'plan', label: t('audit:plan.version'), value: String(plan.n) },
    { key: 'core', label: t('audit:plan.core'), value: plan.coreVersion },
    { key: 'hash', label: t('audit:plan.hash'), value: <code className="break-all">{plan.hash}</code> },
  ];
  const efficiencies = (proposal.efficiencies ?? []).map(({ term, relative }) => ({
    key: `efficiency-${term}`,
    label: t('audit:plan.efficiency', { term }),
    value: figures.one(relative),
  }));
  return (
    <>
      <AuditPart id="design" title={t('audit:plan.title')}>
        <FigureLines lines={[...lines, ...efficiencies, ...origin]} />
        <FigureSources of={['aliases', 'errorLadder', 'runOrder']} {...wording} />
      </AuditPart>
      <AuditPart id="power" title={t('audit:plan.power')} note={t('audit:plan.powerNote')}>
        {plan.power ? <PowerTable power={plan.power} {...wording} /> : <p>{t('audit:plan.noPower')}</p>}
        <FigureSources of={['power']} {...wording} />
      </AuditPart>
      <AuditPart id="levels" title={t('audit:plan.factors')}>
        <FactorTable plan={plan} {...wording} />
      </AuditPart>
      <AuditPart id="order" title={t('audit:plan.runOrder')} note={t('audit:plan.orderNote')}>
        <RunOrderTable
          id="run-order"
          caption={t('audit:plan.runOrder')}
          runs={plan.runs}
          factors={plan.factors}
          {...wording}
        />
      </AuditPart>
      {checks && (
        <AuditPart
          id="check-order"
          title={t('audit:plan.checkOrder')}
          note={t('audit:plan.checkNote', { seed: checks.seed })}
        >
          <RunOrderTable
            id="check-run-order"
            caption={t('audit:plan.checkOrder')}
            runs={checks.runs}
            factors={plan.factors}
            {...wording}
          />
        </AuditPart>
      )}
    </>
  );
}
