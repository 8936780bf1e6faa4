import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import type { Remark, RemarkReply } from '@/models';
import { guestMarkOf, type Reader } from './author';
import { issuedTitle, type PlacedRemark } from './data';

export function isReader(row: Remark | RemarkReply, { actor, guestMark }: Reader): boolean {
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

const mentionsIn = (remark: PlacedRemark, replyId: string | null): string[] =>
  remark.mentions.flatMap((mention) => (mention.replyId === replyId && mention.user ? mention.user.name : []));

function isUnread(remark: PlacedRemark, reader: Reader): boolean {
  if (reader.actor.kind !== 'member') return false;
  const readAt = remark.reads.at(0)?.readAt.getTime() ?? 0;
  return [remark, ...remark.replies].some((row) => !isReader(row, reader) && row.createdAt.getTime() > readAt);
}

export function presentRemark(remark: PlacedRemark, reader: Reader): RemarkAnswer {
  return {
    id: remark.id,
    revisionId: remark.revisionId,
    revisionNumber: remark.revision.number,
    layoutId: remark.layoutId,
    layoutTitle: issuedTitle(remark),
    number: remark.number,
    xMm: remark.xMm,
    yMm: remark.yMm,
    itemId: remark.itemId,
    author: presentAuthor(remark, reader),
    body: remark.body,
    resolvedAt: remark.resolvedAt?.toISOString() ?? null,
    assignee: remark.assignee ? { id: remark.assignee.id, name: remark.assignee.name } : null,
    dueOn: remark.dueOn,
    mentions: mentionsIn(remark, null),
    pictures: remark.pictures.map(({ id, widthPx, heightPx }) => ({ id, widthPx, heightPx })),
    unread: isUnread(remark, reader),
    createdAt: remark.createdAt.toISOString(),
    replies: remark.replies.map((reply) => ({
      id: reply.id,
      author: presentAuthor(reply, reader),
      body: reply.body,
      mentions: mentionsIn(remark, reply.id),
      createdAt: reply.createdAt.toISOString(),
    })),
  };
}
