import { ButtonLink } from '../../../components/ui/ButtonLink.tsx';
import { Callout } from '../../../components/ui/Callout.tsx';
import { PageHead } from '../../../components/ui/PageHead.tsx';
import { SectionTabs } from '../../../components/ui/SectionTabs.tsx';
import type { AuditFrameView } from '../audit-view.ts';
import type { AuditWording } from '../audit-wording.ts';
import { type AuditLook, type AuditPart, auditAddress, auditParts } from './audit-parts.ts';

interface Props extends AuditWording {
  readonly frame: AuditFrameView;
  readonly part: AuditPart;
  readonly look?: AuditLook;
}

/** Pages on which it matters which result is looked at. */
const byResult: readonly AuditPart[] = ['model', 'checks', 'prediction', 'models'];

function isOpen(part: AuditPart, frame: AuditFrameView): boolean {
  return part !== 'check-runs' || frame.hasCheckRuns;
}

/** The head of every page of an audit: which trial, its pages, which result, and what waits for the reader's sign-off. */
export function AuditHead({ frame, part, look = {}, t }: Props) {
  const { trialId, results, waitsFor } = frame;
  return (
    <>
      <PageHead
        title={frame.title || t('audit:untitled', { number: frame.number })}
        note={[t('audit:note', { number: frame.number }), t(`audit:state.${frame.state}`)].join(' \u00b7 ')}
        back={
          frame.isJudged
            ? { href: `/trials/${trialId}/verdict`, label: t('audit:toVerdict') }
            : { href: '/trials', label: t('audit:toTrials') }
        }
      />
      {waitsFor && part !== 'sign-off' && (
        <Callout
          tone="info"
          title={t(`audit:waits.${waitsFor}`)}
          actions={
            <ButtonLink href={auditAddress(trialId, 'sign-off')} kind="secondary" iconEnd="arrow-right">
              {t('audit:waits.open')}
            </ButtonLink>
          }
        />
      )}
      <SectionTabs
        label={t('audit:pages')}
        tabs={auditParts
          .filter((each) => isOpen(each, frame))
          .map((each) => ({
            href: auditAddress(trialId, each, byResult.includes(each) ? look : {}),
            label: t(`audit:part.${each}`),
            current: each === part,
          }))}
      />
      {byResult.includes(part) && results.length > 1 && (
        <nav className="audit-results" aria-label={t('audit:results')}>
          {results.map(({ name }, result) => (
            <a
              key={name}
              href={auditAddress(trialId, part, { result })}
              aria-current={(look.result ?? 0) === result ? 'true' : undefined}
            >
              {name}
            </a>
          ))}
        </nav>
      )}
    </>
  );
}
