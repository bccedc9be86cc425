import type { Analysis, Brief } from '../../../lib/doe/index.ts';
import type { AuditFactor } from '../audit-view.ts';
import type { ModelSpec, PublicModel } from '../model.schema.ts';

/** One model beside others: the trial's own, or an engineer's. */
export interface ComparedModel {
  /** null: the trial's own. */
  id: string | null;
  name: string;
  spec: ModelSpec | null;
  by: string;
  /** null where it cannot be worked out from the readings as they stand. */
  analysis: Analysis | null;
  /** Terms that the hierarchy added. */
  added: string[];
  /** Whether a reading changed since it was last saved. */
  isStale: boolean;
}

export interface ModelsView {
  result: number;
  kind: Brief['response']['kind'];
  factors: AuditFactor[];
  /** The trial's own first. */
  models: ComparedModel[];
  /** Every term that a model may have, shortest first. */
  terms: string[];
  runNumbers: number[];
  stretches: number;
  stored: PublicModel[];
}
