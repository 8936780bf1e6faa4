import { Revision, SignOff } from '@/models';
import { snapshotHash } from '../revisions/snapshot';

export interface CheckedSignOff {
  readonly signOffId: string;
  readonly revisionId: string;
  readonly decision: SignOff['decision'];
  readonly signerName: string;
  readonly signedAt: Date;
  readonly sha256: string;
  /** Of the content that is stored now, worked out anew. */
  readonly storedSha256: string;
  readonly holds: boolean;
}

/** Works out the hash of every signed revision anew, or of one, and says whether it is still the one that was signed. */
export async function checkSignOffs(revisionId?: string): Promise<CheckedSignOff[]> {
  const signOffs = await SignOff.findAll({
    where: revisionId ? { revisionId } : {},
    include: [{ model: Revision, as: 'revision', required: true }],
    order: [['createdAt', 'ASC']],
  });
  return signOffs.flatMap(({ id, revision, decision, signerName, createdAt, sha256 }) => {
    if (!revision) return [];
    const storedSha256 = snapshotHash(revision.snapshot);
    const holds = storedSha256 === sha256;
    return [
      {
        signOffId: id,
        revisionId: revision.id,
        decision,
        signerName,
        signedAt: createdAt,
        sha256,
        storedSha256,
        holds,
      },
    ];
  });
}
