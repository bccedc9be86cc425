import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { Button } from '../../../components/ui/Button.tsx';
import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { phoneCall } from '../board.queries.ts';
import type { Board } from '../board.schema.ts';
import { useBoardTools } from './board-context.tsx';

type Told = NonNullable<Board['stop']>['told'][number];

/** The way to somebody's phone: the number is asked for when it is wanted, because showing it is on record. */
function CallButton({ person }: { readonly person: Told }) {
  const { t } = useTranslation('board');
  const { board } = useBoardTools();
  const [phone, setPhone] = useState<string | null>(null);
  const [isLost, setLost] = useState(false);

  async function show(): Promise<void> {
    try {
      setLost(false);
      setPhone((await phoneCall(board.trialId, person.personId)).phone);
    } catch {
      setLost(true);
    }
  }
  if (phone !== null) {
    return (
      <>
        <ButtonLink icon="call" href={`tel:${phone}`}>
          {phone}
        </ButtonLink>
        <p className="field-help">{t('callRecorded')}</p>
      </>
    );
  }
  return (
    <>
      <Button icon="call" onClick={show}>
        {t('call', { name: person.name })}
      </Button>
      {isLost && <p role="alert">{t('storyLost')}</p>}
    </>
  );
}

/** A trial that is stopped for safety: who was told and has answered, whom to call, and how it may go on. */
export function StopNotice() {
  const { t } = useTranslation('board');
  const { board, formats } = useBoardTools();
  const { stop } = board;
  const told = stop?.told ?? [];
  return (
    <Callout
      tone="stop"
      live="assertive"
      title={stop ? t('stoppedAt', { time: formats.time(stop.at) }) : t('stoppedNow')}
    >
      {told.length === 0 ? (
        <p>{t('toldNobody')}</p>
      ) : (
        <ul className="board-told">
          {told.map((person) => (
            <li key={person.personId}>
              {person.answeredAt === null
                ? t(`told.${person.text}`, { name: person.name })
                : t('toldAnswered', { name: person.name, time: formats.time(person.answeredAt) })}
              {person.answeredAt === null && person.mayCall && <CallButton person={person} />}
            </li>
          ))}
        </ul>
      )}
      <p>{board.resumeByReviewer ? t('resumeByReviewer') : t('resumeWithReason')}</p>
    </Callout>
  );
}
