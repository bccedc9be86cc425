export interface SectionTab {
  readonly href: string;
  readonly label: string;
  readonly current?: boolean | undefined;
}

interface SectionTabsProps {
  readonly label: string;
  readonly tabs: readonly SectionTab[];
}

/** The pages of one thing, such as a trial's board, verdict and audit. Links, so each has an address and the back button works. */
export function SectionTabs({ label, tabs }: SectionTabsProps) {
  return (
    <nav className="section-tabs" aria-label={label}>
      {tabs.map((tab) => (
        <a
          key={tab.href}
          className="section-tab"
          href={tab.href}
          aria-current={tab.current ? 'page' : undefined}
        >
          {tab.label}
        </a>
      ))}
    </nav>
  );
}
