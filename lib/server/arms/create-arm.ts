import { randomUUID } from 'node:crypto';
import type { ArmContent, LibraryArm, NewArm } from '@/lib/contracts/arms';
import { Arm } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { demandRole } from '../policy';
import type { Actor, MemberActor } from '../policy';
import { getArm } from './data';
import { demandReach } from './demand-reach';

/** Puts a first version into the library: from its data, or as a copy of any version. Throws 404 for a foreign `copyOf`. */
export async function createArm(actor: Actor, request: NewArm, outer?: Transaction): Promise<LibraryArm> {
  demandRole(actor, 'integrator');
  return inTransaction(async (transaction) => {
    const copied = 'copyOf' in request ? await getArm(actor, request.copyOf, transaction) : null;
    const content = 'copyOf' in request ? { ...contentOf(copied!), name: request.name } : request;
    const arm = await addVersion(actor, { ...content, familyId: randomUUID(), version: 1 }, transaction);
    const details = { name: arm.name, ...(copied && { copyOf: copied.id }) };
    await recordAudit(actor, { action: 'arm.created', subjectId: arm.id, details }, transaction);
    return arm;
  }, outer);
}

export function contentOf({ name, description, payloadKg, definition }: LibraryArm): ArmContent {
  return { name, description, payloadKg, definition };
}

/** Writes one version down, with the reach that its chain has. Throws 422 for a chain that reaches nowhere. */
export async function addVersion(
  actor: MemberActor,
  row: ArmContent & { familyId: string; version: number },
  transaction: Transaction,
): Promise<LibraryArm> {
  const { organisationId, userId } = actor;
  const { name, description, payloadKg, definition, familyId, version } = row;
  const reachMm = demandReach(definition);
  const { id } = await Arm.create(
    { organisationId, familyId, version, name, description, payloadKg, reachMm, definition, createdBy: userId },
    { transaction },
  );
  return getArm(actor, id, transaction);
}
