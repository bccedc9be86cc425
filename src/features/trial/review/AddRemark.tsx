import { useId, useState } from 'react';
import { useTranslation } from 'react-i18next';
import { v7 } from 'uuid';
import { Button } from '../../../components/ui/Button.tsx';
import { TextArea } from '../../../components/ui/TextArea.tsx';
import { addCommentCall } from '../trial.queries.ts';
import { useReviewWork } from './review-context.tsx';

interface Props {
  readonly label: string;
  readonly place: string;
}

/** Opens a field for a remark on one line. What was typed stays until it has arrived. */
export function AddRemark({ label, place }: Props) {
  const { t } = useTranslation('plan-review');
  const { run, work } = useReviewWork();
  const [isOpen, setOpen] = useState(false);
  const [words, setWords] = useState('');
  const [isEmpty, setEmpty] = useState(false);
  // The same id on a second try: a remark whose answer was lost is not there twice.
  const [commentId, setCommentId] = useState(() => v7());
  const id = useId();

  async function add(): Promise<void> {
    setEmpty(words.trim() === '');
    if (words.trim() === '') {
      document.getElementById(id)?.focus();
      return;
    }
    const isDone = await run(place, ({ id: review }) =>
      addCommentCall(review, { id: commentId, place, words: words.trim() }),
    );
    if (!isDone) return;
    setOpen(false);
    setWords('');
    setCommentId(v7());
  }

  if (!isOpen) {
    return (
      <dd className="review-open">
        <Button
          kind="quiet"
          icon="edit"
          onClick={() => {
            setOpen(true);
            requestAnimationFrame(() => document.getElementById(id)?.focus());
          }}
        >
          {t('remark.open')}
          <span className="sr-only"> {label}</span>
        </Button>
      </dd>
    );
  }
  return (
    <dd className="review-add">
      <TextArea
        id={id}
        label={t('remark.label', { line: label })}
        rows={2}
        maxLength={1_000}
        value={words}
        onChange={({ target }) => setWords(target.value)}
        error={isEmpty && words.trim() === '' ? t('remark.empty') : undefined}
      />
      <div className="button-row">
        <Button onClick={() => setOpen(false)}>{t('remark.cancel')}</Button>
        <Button kind="secondary" busy={work === place} busyLabel={t('remark.adding')} onClick={add}>
          {t('remark.add')}
        </Button>
      </div>
    </dd>
  );
}
