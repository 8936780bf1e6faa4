import type { ArmDefinition } from '@/lib/contracts/arm';
import { armReachMm, NO_REACH } from '@/lib/layout/arm-reach';
import { invalid } from '../errors';

/** Reach of the chain in whole mm. Throws 422 for one that reaches nowhere. */
export function demandReach(definition: ArmDefinition): number {
  const reachMm = Math.round(armReachMm(definition));
  if (reachMm < 1) throw invalid('definition.joints', NO_REACH);
  return reachMm;
}
