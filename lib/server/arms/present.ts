import type { LibraryArm } from '@/lib/contracts/arms';
import type { Arm } from '@/models';

/** `arm` must have been read with the computed attributes of data.ts. */
export function presentArm(arm: Arm): LibraryArm {
  return {
    id: arm.id,
    familyId: arm.familyId,
    version: arm.version,
    name: arm.name,
    description: arm.description,
    payloadKg: arm.payloadKg,
    reachMm: arm.reachMm,
    definition: arm.definition,
    createdAt: arm.createdAt.toISOString(),
    latest: Boolean(arm.get('latest')),
    layoutCount: Number(arm.get('layoutCount')),
    archivedAt: arm.archivedAt?.toISOString() ?? null,
  };
}
