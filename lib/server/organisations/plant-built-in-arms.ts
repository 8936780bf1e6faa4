import { randomUUID } from 'node:crypto';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { armSchema } from '@/lib/contracts/arm';
import { armReachMm } from '@/lib/layout/arm-reach';
import { Arm } from '@/models';
import type { Transaction } from '../database';

/** Puts the built-in arms that the organisation lacks, by name, into its library as first versions. Repeats do no harm. */
export async function plantBuiltInArms(organisationId: string, transaction: Transaction): Promise<void> {
  const known = await Arm.findAll({ attributes: ['name'], where: { organisationId }, transaction });
  const names = new Set(known.map((arm) => arm.name));
  const missing = BUILT_IN_ARMS.filter((builtIn) => !names.has(builtIn.name));
  await Arm.bulkCreate(
    missing.map(({ name, description, payloadKg, arm }) => ({
      organisationId,
      familyId: randomUUID(),
      version: 1,
      name,
      description,
      payloadKg,
      reachMm: Math.round(armReachMm(arm)),
      definition: armSchema.parse(arm),
    })),
    { transaction },
  );
}
