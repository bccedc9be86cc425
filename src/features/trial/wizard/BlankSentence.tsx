import type { ComponentProps } from 'react';
import { FieldError } from '../../../components/ui/FieldError.tsx';

interface Blank extends Omit<ComponentProps<'input'>, 'className'> {
  /** Stands in the sentence where the field goes. */
  readonly mark: string;
  readonly id: string;
  /** Names the field for a screen reader; the eye has the sentence. */
  readonly label: string;
  readonly error?: string | undefined;
}

interface Props {
  /** The sentence with the marks in it, in the order its language asks for. */
  readonly sentence: string;
  readonly blanks: readonly Blank[];
}

/** One sentence with fields in it, as a form on paper has them. */
export function BlankSentence({ sentence, blanks }: Props) {
  const pieces = sentence.split(new RegExp(`(${blanks.map(({ mark }) => mark).join('|')})`));
  return (
    <div className="field">
      <div className="blank-sentence">
        {pieces.map((piece) => {
          const blank = blanks.find(({ mark }) => mark === piece);
          if (!blank) return <span key={piece}>{piece}</span>;
          const { mark, label, error, ...input } = blank;
          return (
            <input
              key={mark}
              type="text"
              autoComplete="off"
              {...input}
              aria-label={label}
              aria-invalid={error ? true : undefined}
              aria-describedby={error ? `${blank.id}-error` : undefined}
              className="input"
            />
          );
        })}
      </div>
      {blanks.map(({ id, error }) => (
        <FieldError key={id} id={id}>
          {error}
        </FieldError>
      ))}
    </div>
  );
}
