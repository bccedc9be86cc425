import type { ReactNode } from 'react';
import { JobTagSettings, type TagSetting } from './JobTagSettings.tsx';
import { Paper } from './Paper.tsx';

interface SettingsCardProps {
  /** The machine. */
  readonly title: ReactNode;
  /** From which trial and when. */
  readonly note?: ReactNode;
  readonly settings: readonly TagSetting[];
  /** Such as the settings to go back to, and whom to call. */
  readonly parts: readonly { readonly title: string; readonly words: ReactNode }[];
  readonly foot?: ReactNode;
}

/** The A5 card that stays at the machine when a trial has closed. */
export function SettingsCard({ title, note, settings, parts, foot }: SettingsCardProps) {
  return (
    <article className="settings-card">
      <Paper />
      <h2>{title}</h2>
      {note && <p>{note}</p>}
      <JobTagSettings settings={settings} />
      {parts.map((part) => (
        <section key={part.title} className="settings-card-part">
          <h3>{part.title}</h3>
          <div>{part.words}</div>
        </section>
      ))}
      {foot && <p className="settings-card-foot">{foot}</p>}
    </article>
  );
}
