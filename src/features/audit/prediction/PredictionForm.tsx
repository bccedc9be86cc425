import { Button } from '../../../components/ui/Button.tsx';
import { NumberInput } from '../../../components/ui/NumberInput.tsx';
import { Select } from '../../../components/ui/Select.tsx';
import type { AuditModelView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import type { AuditLook } from '../frame/audit-parts.ts';
import type { AskedPoint } from './read-point.ts';

interface Props extends AuditWording {
  readonly model: AuditModelView;
  readonly point: AskedPoint;
  readonly look: AuditLook;
}

/** Any point inside the tested window. The address holds it, so it can be sent to somebody. */
export function PredictionForm({ model, point, look, t, figures }: Props) {
  const { brief, factors } = model;
  return (
    <form method="get" className="prediction-form">
      {look.result !== undefined && <input type="hidden" name="result" value={look.result} />}
      {look.model !== undefined && <input type="hidden" name="model" value={look.model} />}
      <div className="prediction-fields">
        {brief.factors.map((factor, place) => {
          const { letter = '', name = '' } = factors[place] ?? {};
          const typed = point.typed[place] ?? '';
          const fault = point.faults[letter];
          const shared = {
            id: `at-${letter}`,
            name: letter,
            label: `${letter} = ${name}`,
            defaultValue: typed,
          };
          if (factor.kind === 'choice') {
            const options = [factor.low, factor.high].map((value) => ({ value, label: value }));
            return <Select key={letter} {...shared} options={options} />;
          }
          const range = t('audit-model:span', {
            from: figures.one(factor.low),
            to: figures.one(factor.high),
          });
          return (
            <NumberInput
              key={letter}
              {...shared}
              unit={factor.unit}
              help={range}
              error={fault && t(`audit-model:prediction.fault.${fault}`, { range })}
            />
          );
        })}
      </div>
      <Button type="submit" kind="primary">
        {t('audit-model:prediction.ask')}
      </Button>
    </form>
  );
}
