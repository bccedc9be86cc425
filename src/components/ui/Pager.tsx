import { ButtonLink } from './ButtonLink.tsx';

interface PagerProps {
  readonly label: string;
  /** Such as "21 to 40 of 63". */
  readonly status?: string | undefined;
  readonly previous?: { readonly href: string; readonly label: string } | undefined;
  readonly next?: { readonly href: string; readonly label: string } | undefined;
}

/** To the page before and the page after. An end of the list simply has no button there. */
export function Pager({ label, status, previous, next }: PagerProps) {
  return (
    <nav className="pager" aria-label={label}>
      <p className="pager-status">{status}</p>
      <div className="button-row">
        {previous && (
          <ButtonLink href={previous.href} icon="chevron-left" rel="prev">
            {previous.label}
          </ButtonLink>
        )}
        {next && (
          <ButtonLink href={next.href} iconEnd="chevron-right" rel="next">
            {next.label}
          </ButtonLink>
        )}
      </div>
    </nav>
  );
}
