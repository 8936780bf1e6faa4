import { literal } from 'sequelize';
import { Organisation, Revision, ShareLink } from '@/models';
import type { SharedRevision } from '@/lib/contracts/share-links';
import { inTransaction } from '../database';
import { notFound } from '../errors';
import { findFloorPlan } from '../floor-plans/data';
import { pictureResponse } from '../floor-plans/read-stored-picture';
import { findRevision } from '../revisions/data';
import { presentRevision } from '../revisions/present';
import { openToken } from './data';
import { readGuestMark } from './guest-mark';
import { recordOpen } from './opens';

/** The revision behind a token, for somebody who opens the link; counts the opening. */
export async function readShared(token: string, request: Request): Promise<SharedRevision> {
  return inTransaction(async (transaction) => {
    const { actor, link } = await openToken(token, transaction);
    const revision = await findRevision(actor, actor.revisionId, transaction);
    const organisation = await Organisation.findByPk(actor.organisationId, { rejectOnEmpty: true, transaction });
    await ShareLink.update(
      // Counted by the database: two who open the link at the same moment are two.
      { openCount: literal('open_count + 1'), lastOpenedAt: new Date() },
      { where: { id: link.id }, transaction },
    );
    const guest = { userAgent: request.headers.get('user-agent'), guestMark: readGuestMark(request) };
    await recordOpen(link.id, guest, transaction);
    const newest = await Revision.max<number, Revision>('number', {
      where: { layoutId: revision.layoutId },
      transaction,
    });
    return {
      organisationName: organisation.name,
      customerName: revision.snapshot.customerName,
      mayRemark: link.mayRemark,
      maySign: link.maySign,
      newerNumber: newest > revision.number ? newest : null,
      expiresAt: link.expiresAt.toISOString(),
      revision: presentRevision(actor, revision),
    };
  });
}

/** The floor plan's picture under the shared revision. Throws not_found where it has none. */
export async function sharedPicture(token: string, widthPx: number, request: Request): Promise<Response> {
  const { actor } = await openToken(token);
  const { snapshot } = await findRevision(actor, actor.revisionId);
  if (!snapshot.floorPlan) throw notFound('picture');
  return pictureResponse(await findFloorPlan(actor, snapshot.floorPlan.id), widthPx, request);
}
