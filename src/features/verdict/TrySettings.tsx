import type { ResourceLanguage } from 'i18next';
import { useMemo, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { Button } from '../../components/ui/Button.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { Choice } from '../../components/ui/Choice.tsx';
import { Slider } from '../../components/ui/Slider.tsx';
import { findSettingDomain } from '../../components/ui/track-scale.ts';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { namespaces } from '../../i18n/namespaces.ts';
import { encode, type FactorSpec, lookAtSettings, type ResultInput } from '../../lib/doe/index.ts';
import { sayLook } from './look-words.ts';
import { sayValue } from './setting-words.ts';
import type { VerdictView } from './verdict-view.ts';
import type { Wording } from './wording.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly view: Pick<VerdictView, 'brief' | 'panelNames' | 'runs'>;
  /** The readings and their analysis, main result first. */
  readonly results: readonly ResultInput[];
  /** The settings to try, where the sliders start. */
  readonly start: readonly (number | string)[];
}

/** Sliders on the settings: what the trial expects there, and a refusal with its reason where it knows nothing. */
export function TrySettings({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <TryParts language={language} {...rest} />
    </IslandRoot>
  );
}

function TryParts({ language, view, results, start }: Omit<Props, 'words'>) {
  const { i18n } = useTranslation('verdict-page');
  const [values, setValues] = useState(start);
  const look = useMemo(() => lookAtSettings(view.brief, results), [view.brief, results]);
  const t = i18n.getFixedT(language, namespaces);
  const wording: Wording = { view, t, formats: formatsFor(language, 'UTC') };
  const coded = view.brief.factors.map((factor, place) => encode(factor, values[place] ?? 0));
  const { lines, tone } = sayLook(look(coded), wording);
  const change = (place: number, value: number | string) => setValues((before) => before.with(place, value));

  return (
    <section className="sheet verdict-try" aria-labelledby="try-settings">
      <h2 id="try-settings">{t('verdict-page:try.title')}</h2>
      <p className="text-steel">{t('verdict-page:try.note')}</p>
      <div className="verdict-sliders">
        {view.brief.factors.map((factor, place) => (
          <TrySetting
            key={factor.name}
            {...{ wording, factor, place }}
            value={values[place] ?? 0}
            onChange={(value) => change(place, value)}
          />
        ))}
      </div>
      <Callout tone={tone} live="polite">
        {lines.map((line) => (
          <p key={line}>{line}</p>
        ))}
      </Callout>
      <div className="button-row">
        <Button onClick={() => setValues(start)}>{t('verdict-page:try.reset')}</Button>
      </div>
    </section>
  );
}

interface TrySettingProps {
  readonly wording: Wording;
  readonly factor: FactorSpec;
  readonly place: number;
  readonly value: number | string;
  readonly onChange: (value: number | string) => void;
}

/** Parts of the range that a slider moves by where the dial's step is not known. */
const STEPS = 20;

function TrySetting({ wording, factor, place, value, onChange }: TrySettingProps) {
  const id = `try-${place}`;
  const label = wording.view.panelNames[place] ?? factor.name;
  if (factor.kind === 'choice')
    return (
      <Choice
        id={id}
        name={id}
        legend={label}
        options={[factor.low, factor.high].map((name) => ({ value: name, label: name }))}
        value={String(value)}
        onChange={(event) => onChange(event.currentTarget.value)}
      />
    );
  const { from, to } = findSettingDomain(factor);
  return (
    <Slider
      id={id}
      label={label}
      min={from}
      max={to}
      step={factor.step ?? (factor.high - factor.low) / STEPS}
      value={Number(value)}
      onChange={(event) => onChange(event.currentTarget.valueAsNumber)}
      valueWords={sayValue(wording, String.fromCharCode(65 + place), value)}
    />
  );
}
