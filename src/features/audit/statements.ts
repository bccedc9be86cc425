import type { Fact } from '../../lib/doe/index.ts';
import type { PageWording } from '../verdict/page/page-wording.ts';
import { sayFact } from '../verdict/verdict-words.ts';
import { figuresBehind } from './figures-behind.ts';

export const statementGroups = [
  'headline',
  'settings',
  'pairs',
  'details',
  'reasons',
  'trust',
  'watched',
  'steadier',
  'cannotTell',
  'next',
  'confirmation',
] as const;
export type StatementGroup = (typeof statementGroups)[number];

/** One statement of a verdict as the supervisor reads it, with where its figures stand. */
export interface Statement {
  group: StatementGroup;
  /** JSON pointer into the stored facts. */
  place: string;
  words: string;
  href: string;
}

/** Every statement of a verdict, in the order of its page. */
export function statementsOf(wording: PageWording): Statement[] {
  const { view } = wording;
  const { verdict, bet, confirmation } = view;
  const facts: [StatementGroup, string, Fact][] = [
    ['headline', '#/verdict/headline', verdict.headline],
    ...statementGroups.flatMap((group): [StatementGroup, string, Fact][] => {
      if (group === 'headline') return [];
      if (group === 'reasons') return bet.reasons.map((fact, at) => [group, `#/bet/reasons/${at}`, fact]);
      if (group === 'confirmation')
        return (confirmation?.facts ?? []).map((fact, at) => [group, `#/confirmation/facts/${at}`, fact]);
      return verdict[group].map((fact, at) => [group, `#/verdict/${group}/${at}`, fact]);
    }),
  ];
  return facts.flatMap(([group, place, fact]) => {
    const href = figuresBehind(view.trialId, fact, view.runs);
    return href === null ? [] : [{ group, place, words: sayFact(fact, wording), href }];
  });
}
