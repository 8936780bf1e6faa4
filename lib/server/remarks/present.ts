import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import type { Remark, RemarkReply } from '@/models';
import { guestMarkOf, type Reader } from './author';
import type { PlacedRemark } from './data';

function isReader(row: Remark | RemarkReply, { actor, guestMark }: Reader): boolean {
  if (actor.kind === 'member') return row.userId === actor.userId;
  return Boolean(guestMark && row.guestEmail && guestMarkOf(row.guestEmail) === guestMark);
}

function presentAuthor(row: Remark | RemarkReply, reader: Reader): RemarkAnswer['author'] {
  return {
    name: row.guestName ?? row.user?.name ?? 'a former member',
    side: row.authorSide,
    you: isReader(row, reader),
  };
}

export function presentRemark(remark: PlacedRemark, reader: Reader): RemarkAnswer {
  return {
    id: remark.id,
    revisionId: remark.revisionId,
    revisionNumber: remark.revision.number,
    number: remark.number,
    xMm: remark.xMm,
    yMm: remark.yMm,
    itemId: remark.itemId,
    author: presentAuthor(remark, reader),
    body: remark.body,
    resolvedAt: remark.resolvedAt?.toISOString() ?? null,
    createdAt: remark.createdAt.toISOString(),
    replies: remark.replies.map((reply) => ({
      id: reply.id,
      author: presentAuthor(reply, reader),
      body: reply.body,
      createdAt: reply.createdAt.toISOString(),
    })),
  };
}
