import { type ReactNode, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { z } from 'zod';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { FaultCallout } from './FaultCallout.tsx';
import { movePersonCall } from './people.queries.ts';
import type { PersonPart } from './person-part.ts';

const openRunsSchema = z.object({
  openRuns: z.array(
    z.object({ runId: z.string(), number: z.number(), trialId: z.string(), trialTitle: z.string() }),
  ),
});
type OpenRuns = z.output<typeof openRunsSchema>['openRuns'];

/** Takes somebody off the crew, once their open runs are handed over, and back on. Both can be undone at once. */
export function PersonCrew({ person, onChange, say }: PersonPart<ReactNode>) {
  const { t } = useTranslation('people');
  const [openRuns, setOpenRuns] = useState<OpenRuns>([]);
  const { busy, fault, submit } = useSubmission(({ code, present }) => {
    const parsed = openRunsSchema.safeParse(present);
    setOpenRuns(code === 'open-runs' && parsed.success ? parsed.data.openRuns : []);
  });
  const { name } = person;

  const back = (from: typeof person) =>
    submit(async () => {
      onChange(await movePersonCall(from, 'activate'));
      say('good', t('leave.undone', { name }));
    });

  const leave = () =>
    submit(async () => {
      setOpenRuns([]);
      const left = await movePersonCall(person, 'deactivate');
      onChange(left);
      say(
        'info',
        <>
          {t('leave.done', { name })}{' '}
          <Button kind="quiet" onClick={() => back(left)}>
            {t('leave.undo')}
          </Button>
        </>,
      );
    });

  return (
    <section className="sheet grid gap-4" aria-labelledby="crew-title">
      <h2 id="crew-title">{t('leave.title')}</h2>
      <p>{person.active ? t('leave.words') : t('leave.away', { name })}</p>
      <FaultCallout fault={fault}>
        {openRuns.length > 0 && (
          <>
            <p className="mt-2">{t('leave.openRuns')}</p>
            <ul>
              {openRuns.map((run) => (
                <li key={run.runId}>
                  <a href={`/trials/${run.trialId}`}>
                    {t('leave.openRun', { run: run.number, trial: run.trialTitle })}
                  </a>
                </li>
              ))}
            </ul>
          </>
        )}
      </FaultCallout>
      <div className="button-row">
        {person.active ? (
          <Button busy={busy} busyLabel={t('form.saving')} onClick={leave}>
            {t('leave.do')}
          </Button>
        ) : (
          <Button busy={busy} busyLabel={t('form.saving')} onClick={() => back(person)}>
            {t('leave.back')}
          </Button>
        )}
      </div>
    </section>
  );
}
