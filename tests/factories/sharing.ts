import { randomBytes } from 'node:crypto';
import type { Snapshot } from '@/lib/contracts/revisions';
import { hashToken, randomToken } from '@/lib/server/tokens';
import { DexterityMap, Layout, MapTile, Remark, Revision, ShareLink } from '@/models';
import { createMember, createOrganisation } from './people';
import { createLayout, emptySnapshot } from './work';

interface RevisionOptions {
  layoutId?: string;
  issuedBy?: string;
  /** What the frozen copy holds besides an empty layout. */
  snapshot?: Partial<Snapshot>;
}

export async function createRevision(options: RevisionOptions = {}): Promise<Revision> {
  const layout = options.layoutId
    ? await Layout.findByPk(options.layoutId, { rejectOnEmpty: true })
    : await createLayout();
  const number = 1 + (await Revision.count({ where: { layoutId: layout.id } }));
  const frozen = emptySnapshot(layout, options.snapshot);
  return Revision.create({ layoutId: layout.id, number, issuedBy: options.issuedBy ?? null, ...frozen });
}

interface ShareLinkOptions {
  revisionId?: string;
  mayRemark?: boolean;
  maySign?: boolean;
  expiresAt?: Date;
  revokedAt?: Date;
}

/** A link and the token that opens it; a token of the same length that opens nothing is `randomToken()`. */
export async function createShareLink(
  options: ShareLinkOptions = {},
): Promise<{ shareLink: ShareLink; token: string }> {
  const token = randomToken();
  // A link that is over was made before it ended.
  const createdAt = new Date(Date.now() - 7 * 24 * 3600 * 1000);
  const shareLink = await ShareLink.create({
    revisionId: options.revisionId ?? (await createRevision()).id,
    tokenHash: hashToken(token),
    mayRemark: options.mayRemark ?? true,
    maySign: options.maySign ?? false,
    expiresAt: options.expiresAt ?? new Date(Date.now() + 24 * 3600 * 1000),
    revokedAt: options.revokedAt ?? null,
    createdAt,
  });
  return { shareLink, token };
}

interface RemarkOptions {
  revisionId?: string;
  userId?: string;
}

/** A remark by a member; without `userId` by a new viewer. */
export async function createRemark(options: RemarkOptions = {}): Promise<Remark> {
  const revision = options.revisionId
    ? await Revision.findByPk(options.revisionId, { rejectOnEmpty: true })
    : await createRevision();
  const { layoutId } = revision;
  return Remark.create({
    revisionId: revision.id,
    layoutId,
    number: 1 + (await Remark.count({ where: { layoutId } })),
    xMm: 1200,
    yMm: -300,
    body: 'Can the door still open here?',
    userId: options.userId ?? (await createMember('viewer')).user.id,
    authorSide: 'customer',
  });
}

/** The row of a map that nobody has computed yet. */
export async function createMap(options: { organisationId?: string } = {}): Promise<DexterityMap> {
  return DexterityMap.create({
    organisationId: options.organisationId ?? (await createOrganisation()).id,
    key: randomBytes(32).toString('hex'),
    input: {},
    grid: { originMm: [-1000, -1000], stepMm: 50, columns: 40, rows: 40 },
    tileCount: 1,
  });
}

/** A finished map whose one tile holds these bytes. */
export async function createFinishedMap(organisationId: string, bytes = Buffer.from('tile')): Promise<DexterityMap> {
  const map = await createMap({ organisationId });
  const none: number[] = [];
  const quantiles = { inverseConditionNumber: none, maximumToolSpeed: none, sureSpeed: none };
  await MapTile.create({ mapId: map.id, index: 0, attempt: 1, bytes });
  return map.update({
    state: 'done',
    attempt: 1,
    tilesDone: 1,
    finishedAt: new Date(),
    summary: { reachedAreaM2: 0, bestInverseConditionNumber: null, fastestToolSpeed: null, quantiles },
  });
}
