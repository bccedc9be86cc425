import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { AuditPart } from '../frame/AuditPart.tsx';
import { FigureLines } from '../frame/FigureLines.tsx';
import { FigureSources } from '../sources/FigureSources.tsx';
import { AnovaTable } from './AnovaTable.tsx';
import { ModelOrigin } from './ModelOrigin.tsx';
import { curvatureLines, errorLines, fitLines } from './model-lines.ts';
import { TermsTable } from './TermsTable.tsx';

interface Props extends AuditWording {
  readonly model: AuditModelView;
}

/** The model of one result: estimates, variance, error, fit and curvature. */
export function ModelFigures({ model, ...wording }: Props) {
  const { t } = wording;
  const { analysis } = model;
  const counted = analysis.scale === 'freeman-tukey' ? (['counts'] as const) : [];
  const plots = analysis.error.strata ? (['strata'] as const) : [];
  const curvature = curvatureLines(model, wording);
  return (
    <>
      <ModelOrigin model={model} t={t} />
      <AuditPart id="terms" title={t('audit-model:terms.title')} note={t('audit-model:terms.note')}>
        <TermsTable model={model} {...wording} />
        {analysis.notEstimable.length > 0 && (
          <p>{t('audit-model:terms.notEstimable', { terms: analysis.notEstimable.join(', ') })}</p>
        )}
        <FigureSources
          of={['effect', 'standardError', 'interval', 'pIndividual', 'pFamily', ...counted]}
          {...wording}
        />
      </AuditPart>
      <AuditPart id="anova" title={t('audit-model:anova.title')}>
        <AnovaTable model={model} {...wording} />
        <FigureSources of={['anova', 'lackOfFit']} {...wording} />
      </AuditPart>
      <AuditPart id="error" title={t('audit-model:error.title')}>
        <FigureLines lines={errorLines(model, wording)} />
        <FigureSources of={['errorLadder', ...plots]} {...wording} />
      </AuditPart>
      <AuditPart id="fit" title={t('audit-model:fit.title')}>
        <FigureLines lines={fitLines(model, wording)} />
        <FigureSources of={['rSquared', 'lackOfFit']} {...wording} />
      </AuditPart>
      <AuditPart id="curvature" title={t('audit-model:curvature.title')}>
        {curvature.length > 0 ? <FigureLines lines={curvature} /> : <p>{t('audit-model:curvature.none')}</p>}
        <FigureSources of={['curvature']} {...wording} />
      </AuditPart>
      <AuditPart id="aliases" title={t('audit-model:aliases.title')}>
        <p className="figures">
          {analysis.aliases
            .filter((alias) => alias.with.length > 0)
            .map((alias) => [alias.term, ...alias.with.map(({ term }) => term)].join(' + '))
            .join('; ') || t('audit-model:aliases.none')}
        </p>
        {analysis.confoundedWithBlocks.length > 0 && (
          <p className="figures">
            {t('audit-model:aliases.blocks', { terms: analysis.confoundedWithBlocks.join(', ') })}
          </p>
        )}
        <FigureSources of={['aliases']} {...wording} />
      </AuditPart>
    </>
  );
}
