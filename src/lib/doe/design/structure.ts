import type { Alias, LayoutRow } from './proposal.ts';

/** A plan before middle runs, promises and limits: which corners, how often, in which blocks and whole plots. */
export interface Structure {
  k: number;
  /** Corners of one repeat. */
  baseRuns: number;
  replicates: number;
  blocks: number;
  generators: string[];
  definingWords: string[];
  resolution: number;
  aliases: Alias[];
  confoundedWithBlocks: string[];
  /** Main effects and the pairs that can be judged, one of each tied group. */
  terms: string[];
  corners: LayoutRow[];
  /** Present when hard settings are grouped; `judged`: whether they can be judged. */
  wholePlots?: { count: number; judged: boolean };
  /** Present when rules took corners away. */
  irregular?: {
    efficiencies: { term: string; relative: number }[];
    /** Pairs of which one corner is never run. */
    emptied: string[];
  };
}
