import { type ReactNode, useId } from 'react';
import { Icon } from './Icon.tsx';
import { JobTagSettings, type TagSetting } from './JobTagSettings.tsx';
import { Paper } from './Paper.tsx';
import { type TagState, tagStateIcons } from './tag-state.ts';

export type { TagSetting } from './JobTagSettings.tsx';

interface JobTagProps {
  /** The run number as it stands on the tag, such as "4". */
  readonly number: string;
  /** The same for a screen reader, such as "Run 4". */
  readonly name: string;
  readonly state: TagState;
  readonly stateWord: string;
  /** The first five are shown. */
  readonly settings: readonly TagSetting[];
  /** Such as "and 2 more"; needed only when there are more than five settings. */
  readonly moreLabel?: string | undefined;
  /** The reading, or who has the run and since when. */
  readonly foot?: ReactNode;
  /** The run that is under way: a strong edge. */
  readonly current?: boolean | undefined;
  /** Makes the whole tag open something: a page, or a panel in an island. */
  readonly href?: string | undefined;
  readonly onOpen?: (() => void) | undefined;
  /** At most two; the rest stands in what the tag opens. */
  readonly actions?: ReactNode;
  /** Printed at the foot of a paper tag: "Job tag. Not a lockout tag." */
  readonly printNote?: string | undefined;
  /** The heading's rank where the tag stands. */
  readonly headingLevel?: 2 | 3 | 4 | undefined;
}

const settingsInView = 5;

interface OpenerProps extends Pick<JobTagProps, 'href' | 'onOpen'> {
  readonly children: ReactNode;
}

function Opener({ href, onOpen, children }: OpenerProps) {
  if (href !== undefined) {
    return (
      <a className="job-tag-open" href={href}>
        {children}
      </a>
    );
  }
  if (!onOpen) return children;
  return (
    <button type="button" className="job-tag-open" onClick={onOpen}>
      {children}
    </button>
  );
}

/** One run: what to set and what was found. The card that hangs on the machine; a row on a phone. */
export function JobTag(props: JobTagProps) {
  const { number, name, state, stateWord, settings, moreLabel, foot, current, href, onOpen } = props;
  const { actions, printNote, headingLevel = 3 } = props;
  const nameId = useId();
  const Heading = `h${headingLevel}` as const;
  const shown = settings.slice(0, settingsInView);
  const hidden = settings.length > shown.length;
  const classes = ['job-tag', current && 'job-tag-current', shown.length > 4 && 'job-tag-full'];

  return (
    <article className={classes.filter(Boolean).join(' ')} data-state={state} aria-labelledby={nameId}>
      <Paper />
      <div className="job-tag-head">
        <Heading className="job-tag-number">
          <Opener href={href} onOpen={onOpen}>
            <span aria-hidden="true">{number}</span>
            <span id={nameId} className="sr-only">
              {name}
            </span>
          </Opener>
        </Heading>
        <p className="job-tag-state">
          <Icon name={tagStateIcons[state]} size={16} />
          {stateWord}
        </p>
      </div>
      <JobTagSettings settings={shown} />
      {(foot || hidden) && (
        <p className="job-tag-foot">
          {foot && <span className="job-tag-foot-words">{foot}</span>}
          {hidden && <span className="job-tag-more">{moreLabel}</span>}
        </p>
      )}
      {actions && <div className="job-tag-actions">{actions}</div>}
      {printNote && <p className="job-tag-print-note">{printNote}</p>}
    </article>
  );
}
