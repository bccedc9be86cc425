/** The stretch of values that a track shows from its left to its right end. */
export interface TrackDomain {
  readonly from: number;
  readonly to: number;
}

/** The part of a track's width that stays free on either side for the words beside a mark. */
const wordMargin = 0.14;

/**
 * Where a value lies on a track.
 * @param margin the part of the width that stays free on either side
 * @returns percent of the track's width, rounded to hundredths; values outside the domain stop at its end
 * @throws RangeError when the domain is empty or not finite
 */
export function placeOnTrack(value: number, { from, to }: TrackDomain, margin = wordMargin): number {
  if (!(to > from) || !Number.isFinite(to - from)) {
    throw new RangeError(`placeOnTrack: domain must rise, not ${from} to ${to}`);
  }
  const part = Math.min(1, Math.max(0, (value - from) / (to - from)));
  return Math.round((margin + part * (1 - 2 * margin)) * 1e4) / 100;
}

export interface SettingTrackValues {
  readonly low: number;
  readonly high: number;
  readonly now?: number | undefined;
  readonly next?: number | undefined;
  readonly min?: number | undefined;
  readonly max?: number | undefined;
}

/**
 * The domain of a setting's track: its machine limits where they are known, else the window with half of its width on
 * either side; always wide enough for every value that is shown.
 */
export function findSettingDomain({ low, high, now, next, min, max }: SettingTrackValues): TrackDomain {
  const spare = (high - low) / 2 || Math.abs(low) / 2 || 1;
  const shown = [low, high, now, next, min, max].filter((value) => value !== undefined);
  return {
    from: Math.min(min ?? low - spare, ...shown),
    to: Math.max(max ?? high + spare, ...shown),
  };
}
