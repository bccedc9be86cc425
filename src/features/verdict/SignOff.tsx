import type { ResourceLanguage } from 'i18next';
import { useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { IslandRoot } from '../../components/island/IslandRoot.tsx';
import { useSubmission } from '../../components/island/use-submission.ts';
import { Button } from '../../components/ui/Button.tsx';
import { Callout } from '../../components/ui/Callout.tsx';
import { TextArea } from '../../components/ui/TextArea.tsx';
import { formatsFor } from '../../i18n/format.ts';
import type { Language } from '../../i18n/languages.ts';
import { FaultCallout } from '../people/FaultCallout.tsx';
import type { PublicReview } from '../trial/review.schema.ts';
import { addCommentCall, decideReviewCall, trialEventCall } from '../trial/trial.queries.ts';

interface Props {
  readonly language: Language;
  readonly words: ResourceLanguage;
  readonly timeZone: string;
  readonly trialId: string;
  readonly revision: number;
  readonly review: PublicReview;
  readonly mayDecide: boolean;
  readonly mayAskAgain: boolean;
}

const tones = {
  asked: 'caution',
  approved: 'good',
  'sent back': 'caution',
  'taken back': 'info',
  reopened: 'caution',
  unchecked: 'info',
} as const;

/** The engineer's word: where it stands, with the remarks, and what this reader may do about it. */
export function SignOff({ words, ...rest }: Props) {
  return (
    <IslandRoot language={rest.language} words={words}>
      <SignOffParts {...rest} />
    </IslandRoot>
  );
}

function SignOffParts({ language, timeZone, review, ...rest }: Omit<Props, 'words'>) {
  const { t } = useTranslation('verdict-page');
  const formats = formatsFor(language, timeZone);
  const subject = review.subject === 'adoption' ? 'adoption' : 'verdict';
  const at = formats.dateTime(review.decidedAt ?? review.askedAt);
  const by = review.decidedBy ?? review.askedBy;
  const open =
    review.state === 'approved' ? [] : review.comments.filter(({ settledAt }) => settledAt === null);
  return (
    <Callout tone={tones[review.state]} title={t(`signOff.${subject}.${review.state}`, { by, at })}>
      {open.length > 0 && (
        <ul className="verdict-lines">
          {open.map((comment) => (
            <li key={comment.id}>
              <strong>{comment.by}</strong>: {comment.words}
            </li>
          ))}
        </ul>
      )}
      {review.state === 'asked' && !rest.mayDecide && <p>{t('review.words')}</p>}
      {rest.mayDecide && <Decide review={review} />}
      {rest.mayAskAgain && <AskAgain trialId={rest.trialId} revision={rest.revision} />}
    </Callout>
  );
}

/** Agrees, or sends back with a remark: what is sent back without one helps nobody. */
function Decide({ review }: { readonly review: PublicReview }) {
  const { t } = useTranslation('verdict-page');
  const [remark, setRemark] = useState('');
  const [lacksRemark, setLacksRemark] = useState(false);
  const { busy, fault, submit } = useSubmission();
  const decide = (action: 'approve' | 'send-back') => {
    const words = remark.trim();
    setLacksRemark(action === 'send-back' && words === '');
    if (action === 'send-back' && words === '') return;
    void submit(async () => {
      if (words !== '') await addCommentCall(review.id, { id: v7(), place: '#', words });
      await decideReviewCall(review, action);
      window.location.reload();
    });
  };
  return (
    <div className="grid gap-3">
      <TextArea
        id="remark"
        label={t('signOff.remark')}
        value={remark}
        maxLength={1000}
        onChange={(event) => setRemark(event.currentTarget.value)}
        error={lacksRemark ? t('signOff.needsRemark') : undefined}
      />
      <FaultCallout fault={fault} />
      <div className="button-row">
        <Button busy={busy} busyLabel={t('decide.saving')} onClick={() => decide('send-back')}>
          {t('signOff.sendBack')}
        </Button>
        <Button kind="primary" busy={busy} busyLabel={t('decide.saving')} onClick={() => decide('approve')}>
          {t('signOff.agree')}
        </Button>
      </div>
    </div>
  );
}

function AskAgain({ trialId, revision }: Pick<Props, 'trialId' | 'revision'>) {
  const { t } = useTranslation('verdict-page');
  const { busy, fault, submit } = useSubmission();
  const ask = () =>
    submit(async () => {
      await trialEventCall(trialId, { event: 'send for review', revision });
      window.location.reload();
    });
  return (
    <div className="grid gap-3">
      <p>{t('signOff.mend')}</p>
      <FaultCallout fault={fault} />
      <div className="button-row">
        <a href={`/trials/${trialId}/board`}>{t('signOff.board')}</a>
        <Button kind="primary" busy={busy} busyLabel={t('decide.saving')} onClick={ask}>
          {t('signOff.again')}
        </Button>
      </div>
    </div>
  );
}
