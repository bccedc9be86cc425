import type { ReactNode } from 'react';
import { CanYouTrust } from './CanYouTrust.tsx';
import { Decisions } from './Decisions.tsx';
import { HowMuchBetter } from './HowMuchBetter.tsx';
import { IfItGoesWrong } from './IfItGoesWrong.tsx';
import { MoreReasons } from './MoreReasons.tsx';
import type { PageWording } from './page-wording.ts';
import { TellYourBoss } from './TellYourBoss.tsx';
import { TopSentence } from './TopSentence.tsx';
import { CannotTell, WhatNext } from './WhatNext.tsx';
import { WhatToSet } from './WhatToSet.tsx';
import { WhyWeSaySo } from './WhyWeSaySo.tsx';

interface Props extends PageWording {
  /** The button that plans check runs, the settings to play with, and the decision; each needs a script. */
  readonly checkRuns?: ReactNode;
  readonly trySettings?: ReactNode;
  readonly decide?: ReactNode;
  readonly share?: ReactNode;
  readonly signOff?: ReactNode;
  /** How settings hold, and opening again. */
  readonly after?: ReactNode;
  /** How the next trial begins, and those that began already. */
  readonly nextTrial?: ReactNode;
  readonly following?: ReactNode;
}

/** The whole verdict in the order in which a supervisor asks. The five answers print on one sheet. */
export function VerdictBody({
  checkRuns,
  trySettings,
  decide,
  share,
  signOff,
  after,
  nextTrial,
  following,
  ...wording
}: Props) {
  return (
    <div className="verdict">
      <TopSentence {...wording} signOff={signOff} />
      <WhatToSet {...wording} />
      <HowMuchBetter {...wording} />
      <CanYouTrust {...wording} checkRuns={checkRuns} />
      <IfItGoesWrong {...wording} />
      <TellYourBoss {...wording} />
      <WhyWeSaySo {...wording} />
      <div className="no-print">{trySettings}</div>
      <MoreReasons {...wording} />
      <CannotTell {...wording} />
      <WhatNext {...wording} />
      {following}
      <div className="no-print">{nextTrial}</div>
      <Decisions {...wording} />
      <div className="no-print">{decide}</div>
      <div className="no-print">{after}</div>
      <div className="no-print">{share}</div>
    </div>
  );
}
