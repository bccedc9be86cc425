import { useTranslation } from 'react-i18next';
import { Callout } from '../../../components/ui/Callout.tsx';
import type { Language } from '../../../i18n/languages.ts';
import type { Fact } from '../../../lib/doe/index.ts';
import { type CoachNames, coachWords } from './coach-words.ts';
import { useWizard } from './wizard-context.ts';

type Place = 'parts' | 'worth' | 'settings' | { letter: string };

const placeOfKind: Partial<Record<Fact['kind'], 'parts' | 'worth' | 'settings'>> = {
  'parts-meet-setup': 'parts',
  'worth-having-below-sight': 'worth',
  'settings-alike': 'settings',
  'many-settings-for-runs': 'settings',
};

function standsAt(fact: Fact, place: Place): boolean {
  const general = placeOfKind[fact.kind];
  if (typeof place === 'string') return general === place;
  return general === undefined && fact.refs.factors?.[0] === place.letter;
}

interface Props {
  readonly of: Place;
  /** Kinds that an error at the field says already. */
  readonly besides?: readonly Fact['kind'][] | undefined;
}

/** What an experienced eye would remark on these answers, beside them. */
export function CoachLines({ of, besides = [] }: Props) {
  const { t, i18n } = useTranslation('wizard');
  const { soFar, answers } = useWizard();
  const names: CoachNames = {
    settings: answers.settings?.settings.map(({ name }) => name ?? '') ?? [],
    result: answers.result ?? {},
  };
  const lines = soFar.coaching
    .filter((fact) => standsAt(fact, of) && !besides.includes(fact.kind))
    .flatMap((fact) => coachWords(fact, names, t, i18n.language as Language) ?? []);
  return (
    <div role="status" className={lines.length > 0 ? 'grid gap-2' : 'hidden'}>
      {lines.map((line) => (
        <Callout key={line.words} tone={line.tone}>
          {line.words}
        </Callout>
      ))}
    </div>
  );
}
