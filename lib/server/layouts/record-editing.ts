import { Op, type Transaction } from 'sequelize';
import { AuditEvent, type Layout } from '@/models';
import { recordAudit } from '../audit';
import type { MemberActor } from '../policy';

/**
 * A sheet is stored every few seconds while somebody draws: each stretch of half an hour is written down once, with the version that
 * it began from. What was done in it stands in the table of operations.
 */
const STRETCH_MS = 30 * 60 * 1000;

export async function recordEditing(actor: MemberActor, layout: Layout, transaction: Transaction): Promise<void> {
  const recent = await AuditEvent.findOne({
    attributes: ['id'],
    where: {
      organisationId: actor.organisationId,
      userId: actor.userId,
      action: 'layout.edited',
      subjectId: layout.id,
      createdAt: { [Op.gt]: new Date(Date.now() - STRETCH_MS) },
    },
    transaction,
  });
  if (recent) return;
  const details = { letter: layout.letter, fromVersion: layout.version };
  await recordAudit(actor, { action: 'layout.edited', subjectId: layout.id, details }, transaction);
}
