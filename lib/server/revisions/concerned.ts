import { Op, type Transaction } from 'sequelize';
import { Membership, ProjectViewer, Remark, RemarkReply, Revision, SignOff, User } from '@/models';
import { planningRecipients } from '../members/planning-recipients';
import type { PlacedRevision } from './data';

export interface Concerned {
  readonly email: string;
  /** Where they read it; null for guests, whose link cannot be repeated because its token is not kept. */
  readonly path: string | null;
}

async function viewersOf(projectId: string, transaction: Transaction): Promise<string[]> {
  const grants = await ProjectViewer.findAll({
    where: { projectId },
    include: [
      {
        model: Membership,
        as: 'membership',
        required: true,
        where: { role: 'viewer' },
        include: [{ model: User, as: 'user', required: true }],
      },
    ],
    transaction,
  });
  return grants.flatMap(({ membership }) => membership?.user?.email ?? []);
}

/** Guests who have remarked on or signed any revision of the layout. */
async function guestsOf(layoutId: string, transaction: Transaction): Promise<string[]> {
  const known = { guestEmail: { [Op.ne]: null } };
  const remarks = await Remark.findAll({ where: { layoutId }, attributes: ['id', 'guestEmail'], transaction });
  const replies = await RemarkReply.findAll({
    where: { ...known, remarkId: remarks.map(({ id }) => id) },
    attributes: ['guestEmail'],
    transaction,
  });
  const signOffs = await SignOff.findAll({
    where: { shareLinkId: { [Op.ne]: null } },
    attributes: ['signerEmail'],
    include: [{ model: Revision, as: 'revision', attributes: [], required: true, where: { layoutId } }],
    transaction,
  });
  return [
    ...[...remarks, ...replies].flatMap(({ guestEmail }) => guestEmail ?? []),
    ...signOffs.map(({ signerEmail }) => signerEmail),
  ];
}

/**
 * Everyone who is told that a revision was issued or signed: those who planned it, the project's viewers, and the guests who have
 * taken part in the layout. Each address once. Call it with a revision that the actor has been shown to reach.
 */
export async function concernedBy(revision: PlacedRevision, transaction: Transaction): Promise<Concerned[]> {
  const byAddress = new Map<string, Concerned>();
  const add = (emails: readonly string[], path: string | null) => {
    for (const email of emails) if (!byAddress.has(email)) byAddress.set(email, { email, path });
  };
  const path = `/revisions/${revision.id}`;
  add(
    (await planningRecipients(revision.id, transaction)).map(({ email }) => email),
    path,
  );
  add(await viewersOf(revision.layout.projectId, transaction), path);
  add(await guestsOf(revision.layoutId, transaction), null);
  return [...byAddress.values()];
}
