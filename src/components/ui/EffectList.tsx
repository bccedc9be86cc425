import type { ReactNode } from 'react';
import { EffectTrack, type EffectTrackValues, findEffectDomain } from './EffectTrack.tsx';

export interface EffectRow extends EffectTrackValues {
  readonly key: string;
  /** What was changed, such as "Jaw temp 140 to 160". */
  readonly name: ReactNode;
  /** Change and interval, such as "6 N stronger, 4 to 8". */
  readonly size: ReactNode;
  /** The call and how sure, such as "Matters. Clear." */
  readonly call: ReactNode;
}

interface EffectListProps {
  /** In the order to be shown: the caller sorts. */
  readonly rows: readonly EffectRow[];
  readonly worthHaving: number;
  readonly worseLabel: string;
  readonly betterLabel: string;
  readonly bandLabel: string;
}

/** Every change on one scale, each with its words beside it, below it on a phone. */
export function EffectList({ rows, worthHaving, worseLabel, betterLabel, bandLabel }: EffectListProps) {
  const domain = findEffectDomain(rows, worthHaving);
  return (
    <div className="effects">
      <div className="effects-head" aria-hidden="true">
        <p className="effects-scale">
          <span>{worseLabel}</span>
          <span>{bandLabel}</span>
          <span>{betterLabel}</span>
        </p>
      </div>
      <ul>
        {rows.map((row) => (
          <li key={row.key} className="effect">
            <p className="effect-name">{row.name}</p>
            <EffectTrack
              change={row.change}
              from={row.from}
              to={row.to}
              worthHaving={worthHaving}
              domain={domain}
            />
            <div>
              <p>{row.size}</p>
              <p className="effect-call">{row.call}</p>
            </div>
          </li>
        ))}
      </ul>
    </div>
  );
}
