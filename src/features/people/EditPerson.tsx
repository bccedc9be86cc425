import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { ResourceLanguage } from 'i18next';
import { useTranslation } from 'react-i18next';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { Toast, ToastList } from '../../components/ui/Toast.tsx';
import { useToasts } from '../../components/ui/use-toasts.ts';
import type { Language } from '../../i18n/languages.ts';
import { PersonCrew } from './PersonCrew.tsx';
import { PersonPrivacy } from './PersonPrivacy.tsx';
import { PersonSheet } from './PersonSheet.tsx';
import { PersonTexts } from './PersonTexts.tsx';
import { personOptions } from './people.queries.ts';
import type { PersonPage } from './person-page.schema.ts';
import type { PublicPerson } from './public-person.ts';
import type { PeopleReader } from './reach.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly first: PersonPage;
  readonly reader: PeopleReader;
  readonly timeZone: string;
}

/** Everything about one person: their data, their consent, whether they are on the crew, and what is held about them. */
export function EditPerson({ language, words, ...rest }: Props) {
  return (
    <IslandRoot language={language} words={words}>
      <PersonParts language={language} {...rest} />
    </IslandRoot>
  );
}

function PersonParts({ first, reader, language, timeZone }: Omit<Props, 'words'>) {
  const { t } = useTranslation('people');
  const client = useQueryClient();
  const options = personOptions(first);
  const { person, consentHistory } = useQuery(options).data;
  const { toasts, show, close } = useToasts();

  /** Takes over what the server answered, and fetches the history that goes with it. */
  function takeOver(changed: PublicPerson): void {
    client.setQueryData(options.queryKey, { person: changed, consentHistory });
    void client.invalidateQueries({ queryKey: options.queryKey });
  }
  const parts = { person, reader, onChange: takeOver, say: show };

  return (
    <div className="grid max-w-180 gap-8">
      {!person.erased && <PersonSheet {...parts} />}
      {!person.erased && (
        <PersonTexts {...parts} history={consentHistory} language={language} timeZone={timeZone} />
      )}
      {!person.erased && reader.reach === 'everybody' && <PersonCrew {...parts} />}
      {reader.reach === 'everybody' && <PersonPrivacy {...parts} />}
      <ToastList label={t('notices')}>
        {toasts.map(({ id, tone, words }) => (
          <Toast key={id} tone={tone} closeLabel={t('close')} onClose={() => close(id)}>
            {words}
          </Toast>
        ))}
      </ToastList>
    </div>
  );
}
