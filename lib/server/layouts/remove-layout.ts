import type { Transaction } from 'sequelize';
import { Revision } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import type { MemberActor } from '../policy';
import { findLayout } from './data';

/** Deletes a variant that was never issued. Throws 409 `layout_issued` otherwise. */
export async function removeLayout(actor: MemberActor, layoutId: string, outer?: Transaction): Promise<void> {
  await inTransaction(async (transaction) => {
    // Issuing holds the layout too, so no revision can come in between.
    const layout = await findLayout(actor, layoutId, transaction, { lock: true });
    if ((await Revision.count({ where: { layoutId: layout.id }, transaction })) > 0) {
      throw conflict(
        'layout_issued',
        `Variant ${layout.letter} was issued for review, so it is kept. Archive the project when its work is over.`,
      );
    }
    await layout.destroy({ transaction });
    const details = { letter: layout.letter, name: layout.name };
    await recordAudit(actor, { action: 'layout.removed', subjectId: layoutId, details }, transaction);
  }, outer);
}
