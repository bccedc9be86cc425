import { Callout } from '../../../components/ui/Callout.tsx';
import { predict, predictInUnit } from '../../../lib/doe/index.ts';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { AuditPart } from '../frame/AuditPart.tsx';
import type { AuditLook } from '../frame/audit-parts.ts';
import { FigureLines } from '../frame/FigureLines.tsx';
import { ModelOrigin } from '../model/ModelOrigin.tsx';
import { FigureSources } from '../sources/FigureSources.tsx';
import { PredictionForm } from './PredictionForm.tsx';
import type { AskedPoint } from './read-point.ts';

interface Props extends AuditWording {
  readonly model: AuditModelView;
  readonly point: AskedPoint;
  readonly look: AuditLook;
}

function unitOf({ spec }: AuditModelView, t: AuditWording['t']): string {
  return spec.kind === 'rejects' ? t('audit-model:prediction.share') : spec.unit;
}

/** What the model says of a point: of the mean, of one new run, of one new part. */
export function PredictionFigures({ model, point, look, ...wording }: Props) {
  const { t, figures } = wording;
  const { analysis, transform } = model;
  const isScaled = analysis.scale !== 'raw' || transform.kind !== 'none';
  const span = (ends: [number, number] | null) =>
    ends === null
      ? t('audit-model:none')
      : t('audit-model:span', { from: figures.one(ends[0]), to: figures.one(ends[1]) });
  const found = point.coded && predictInUnit(analysis, point.coded, transform);
  const onScale = point.coded && predict(analysis, point.coded);
  return (
    <>
      <ModelOrigin model={model} t={t} />
      <AuditPart
        id="prediction"
        title={t('audit-model:prediction.title')}
        note={t('audit-model:prediction.note')}
      >
        <PredictionForm model={model} point={point} look={look} {...wording} />
        {point.isForbidden && <Callout tone="stop" title={t('audit-model:prediction.forbidden')} />}
        {found && onScale && (
          <FigureLines
            lines={[
              {
                key: 'fit',
                label: t('audit-model:prediction.fit'),
                value: `${figures.one(found.fit)} ${unitOf(model, t)}`,
              },
              { key: 'ci', label: t('audit-model:prediction.ci'), value: span(found.ci) },
              { key: 'pi', label: t('audit-model:prediction.pi'), value: span(found.pi) },
              ...(found.piPart
                ? [{ key: 'part', label: t('audit-model:prediction.piPart'), value: span(found.piPart) }]
                : []),
              ...(found.bendRange
                ? [{ key: 'bend', label: t('audit-model:prediction.bend'), value: span(found.bendRange) }]
                : []),
              {
                key: 'se',
                label: t('audit-model:prediction.se'),
                value: onScale.seFit === null ? t('audit-model:none') : figures.one(onScale.seFit),
              },
              {
                key: 'coded',
                label: t('audit-model:prediction.coded'),
                value: (point.coded ?? []).map(figures.one).join('; '),
              },
            ]}
          />
        )}
        {isScaled && <p>{t('audit-model:prediction.back')}</p>}
        <FigureSources of={['prediction', 'bestBet']} {...wording} />
      </AuditPart>
    </>
  );
}
