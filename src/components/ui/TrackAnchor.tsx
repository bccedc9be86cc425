import type { ReactNode } from 'react';

interface TrackAnchorProps {
  /** Of the track's width. */
  readonly percent: number;
  readonly children: ReactNode;
}

/** A place on a track from which its drawing is measured in px, so that it keeps its size however wide the track is. */
export function TrackAnchor({ percent, children }: TrackAnchorProps) {
  return (
    <svg x={`${percent}%`} className="track-anchor" aria-hidden="true">
      {children}
    </svg>
  );
}
