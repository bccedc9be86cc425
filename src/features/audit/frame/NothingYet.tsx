import { EmptyState } from '../../../components/ui/EmptyState.tsx';
import type { AuditWording } from '../audit-wording.ts';

interface Props extends Pick<AuditWording, 't'> {
  readonly why: 'no-plan' | 'not-in' | 'no-readings' | 'no-result' | 'no-checks';
}

/** Stands where figures will be. */
export function NothingYet({ why, t }: Props) {
  return <EmptyState title={t(`audit:nothing.${why}.title`)}>{t(`audit:nothing.${why}.words`)}</EmptyState>;
}
