import { letterAt, meanOfParts, usualValues } from '../../../lib/doe/index.ts';
import { resultsOf } from './check-tables.ts';
import { escapeHtml, sectionHtml, tableHtml, termsHtml } from './html.ts';
import type { PackReader } from './pack-words.ts';
import { evidenceHtml, writeFigure } from './report-evidence.ts';
import style from './report-style.css?raw';
import type { TrialFile } from './trial-file.schema.ts';

type Plan = TrialFile['plans'][number];

function planHtml({ proposal, seed, hash }: Plan, { t }: PackReader): string {
  const { generators, resolution, errorPlan } = proposal;
  const isFull = !Number.isFinite(resolution);
  return sectionHtml(
    t('audit-pack:report.plan'),
    termsHtml([
      [t('audit-pack:report.runs'), String(proposal.runs)],
      [t('audit-pack:report.generators'), generators.join(', ') || t('audit-pack:report.none')],
      [t('audit-pack:report.resolution'), isFull ? t('audit-pack:report.full') : String(resolution)],
      [t('audit-pack:report.errorPlan'), errorPlan.rung],
      [t('audit-pack:report.seed'), String(seed)],
      [t('audit-pack:report.hash'), hash],
    ]),
  );
}

function settingsHtml({ brief }: Plan, { t }: PackReader): string {
  const usual = usualValues(brief);
  const head = ['setting', 'low', 'high', 'usual'] as const;
  const rows = brief.factors.map((factor, place) => [
    `${letterAt(place)} ${factor.name}${factor.kind === 'number' && factor.unit ? ` (${factor.unit})` : ''}`,
    String(factor.low),
    String(factor.high),
    String(usual[place] ?? ''),
  ]);
  return sectionHtml(
    t('audit-pack:report.settings'),
    tableHtml(
      head.map((name) => t(`audit-pack:report.${name}`)),
      rows,
    ),
  );
}

function figureOf(run: TrialFile['runs'][number], result: number): string {
  const counted = run.readings.filter((reading) => reading.result === result && reading.state === 'counts');
  const [first] = counted;
  if (!first) return '';
  if (first.rejects !== null) return `${first.rejects} / ${first.lot ?? ''}`;
  return writeFigure(meanOfParts(counted.flatMap(({ value }) => value ?? [])));
}

function readingsHtml({ runs }: TrialFile, { brief }: Plan, { t }: PackReader): string {
  const results = [brief.response, ...brief.watch];
  const head = [
    t('audit-pack:report.run'),
    t('audit-pack:report.order'),
    t('audit-pack:report.block'),
    ...brief.factors.map(({ name }, place) => `${letterAt(place)} ${name}`),
    ...results.map(({ name, unit }) => (unit ? t('audit-pack:report.mean', { name, unit }) : name)),
    t('audit-pack:report.end'),
  ];
  const inOrder = [...runs].sort((one, other) => one.place - other.place);
  const rows = inOrder.map((run) => [
    String(run.number),
    String(run.place),
    String(run.block),
    ...(run.actual ?? run.planned).map(String),
    ...results.map((_, result) => figureOf(run, result)),
    run.end ?? '',
  ]);
  return sectionHtml(t('audit-pack:report.readings'), tableHtml(head, rows));
}

function verdictHtml(file: TrialFile, said: readonly string[], { t, formats }: PackReader): string {
  const verdict = file.verdicts.at(-1);
  if (!verdict)
    return sectionHtml(t('audit-pack:report.plan'), `<p>${escapeHtml(t('audit-pack:report.noVerdict'))}</p>`);
  return sectionHtml(
    t('audit-pack:report.verdict', { n: verdict.n }),
    ...said.map((sentence) => `<p>${escapeHtml(sentence)}</p>`),
    termsHtml([
      [t('audit-pack:report.madeAt'), formats.dateTime(verdict.at)],
      [t('audit-pack:report.inputHash'), verdict.inputHash],
    ]),
  );
}

function listedHtml(title: string, lines: readonly string[], none: string): string {
  const items = lines.map((line) => `<li>${escapeHtml(line)}</li>`).join('\n');
  return sectionHtml(title, lines.length > 0 ? `<ul>${items}</ul>` : `<p>${escapeHtml(none)}</p>`);
}

function historyHtml({ decisions, reviews }: TrialFile, { t, formats }: PackReader): string[] {
  const decided = decisions.map(({ outcome, note, at }) =>
    [formats.dateTime(at), t(`audit-pack:report.outcome.${outcome}`), note].filter(Boolean).join(': '),
  );
  const reviewed = reviews.map(({ subject, round, state, decidedAt, askedAt, subjectHash }) => {
    const what = [t(`audit-pack:report.subject.${subject}`), t('audit-pack:report.round', { round })].join(
      ', ',
    );
    const how = [t(`audit-pack:report.reviewState.${state}`), subjectHash].join(', ');
    return `${formats.dateTime(decidedAt ?? askedAt)}: ${what}: ${how}`;
  });
  return [
    listedHtml(t('audit-pack:report.decisions'), decided, t('audit-pack:report.none')),
    listedHtml(t('audit-pack:report.reviews'), reviewed, t('audit-pack:report.none')),
  ];
}

/**
 * The trial as one page that needs nothing beside it: for any browser, and for paper.
 * @param said the sentences of the latest verdict
 */
export function writeReport(file: TrialFile, said: readonly string[], reader: PackReader): string {
  const { t, language } = reader;
  const { number, title, machine, state } = file.trial;
  const heading = t('audit-pack:report.title', { number });
  const plan = file.plans.filter(({ phase }) => phase === 'main').at(-1);
  const about = termsHtml([
    [t('audit-pack:report.machine'), machine],
    [t('audit-pack:report.state'), t(`trials:state.${state}`)],
  ]);
  const parts = [
    verdictHtml(file, said, reader),
    ...(plan ? [planHtml(plan, reader), settingsHtml(plan, reader), readingsHtml(file, plan, reader)] : []),
    evidenceHtml(resultsOf(file.verdicts.at(-1)), reader),
    ...historyHtml(file, reader),
  ];
  return `<!doctype html>
<html lang="${escapeHtml(language)}">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${escapeHtml(`${heading}: ${title}`)}</title>
<style>${style}</style>
</head>
<body>
<h1>${escapeHtml(title)}</h1>
<p>${escapeHtml(heading)}</p>
${about}
${parts.join('\n')}
</body>
</html>
`;
}
