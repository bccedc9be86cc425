import type { Hazard } from '../../../../components/ui/HazardSign.tsx';
import type { HazardName } from '../../answer-choices.ts';

/** The warning triangle of each hazard. */
export const hazardSigns: Readonly<Record<HazardName, Hazard>> = {
  hotParts: 'hot',
  pressure: 'pressure',
  movingParts: 'moving',
  chemicals: 'chemicals',
  electricity: 'electricity',
  dustOrFumes: 'dust',
  lifting: 'lifting',
  loudNoise: 'noise',
};
