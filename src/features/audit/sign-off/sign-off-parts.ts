import type { PageWording } from '../../verdict/page/page-wording.ts';
import { statementGroups, statementsOf } from '../statements.ts';
import type { SignOffLine, SignOffPart } from './sign-off-line.ts';

/** The statements of a verdict, group by group, as lines to be signed off. */
function verdictParts(wording: PageWording): SignOffPart[] {
  const { t } = wording;
  const statements = statementsOf(wording);
  return statementGroups.flatMap((group) => {
    const own = statements.filter((each) => each.group === group);
    if (own.length === 0) return [];
    const title = t(`audit-review:group.${group}`);
    const lines = own.map(
      ({ place, words, href }, at): SignOffLine => ({
        place,
        label: own.length > 1 ? `${title} ${at + 1}` : title,
        words,
        href,
      }),
    );
    return [{ title, lines }];
  });
}

/** What was decided last, before the verdict it rests on. */
function decisionPart({ view, t, formats }: PageWording): SignOffPart[] {
  const [decision] = view.decisions;
  if (!decision) return [];
  const settings = view.bet.actual.map((value, place) => {
    const shown = typeof value === 'number' ? formats.number(value) : value;
    return [view.panelNames[place] ?? '', shown, view.units[place] ?? '']
      .filter((part) => part !== '')
      .join(' ');
  });
  const line = (place: string, label: string, words: string): SignOffLine => ({
    place,
    label,
    words,
    href: null,
  });
  return [
    {
      title: t('audit-review:decision.title'),
      lines: [
        line('#/decision/settings', t('audit-review:decision.settings'), formats.list(settings)),
        ...(decision.note ? [line('#/decision/note', t('audit-review:decision.note'), decision.note)] : []),
      ],
    },
  ];
}

export function signOffParts(subject: 'verdict' | 'adoption', wording: PageWording): SignOffPart[] {
  return [...(subject === 'adoption' ? decisionPart(wording) : []), ...verdictParts(wording)];
}
