import type { Transaction } from 'sequelize';
import { sendMailLater, type TemplateData } from '../mail';
import type { User } from '@/models';
import { planningRecipients } from '../members/planning-recipients';
import type { MemberActor } from '../policy';
import { writerName, writerSide, type Writer } from './author';
import { issuedTitle, type PlacedRemark } from './data';

interface Recipient {
  readonly email: string;
  /** Where they read it; null for a guest, whose link cannot be repeated because its token is not kept. */
  readonly path: string | null;
}

async function plannerSide(remark: PlacedRemark, transaction: Transaction): Promise<Recipient[]> {
  const { layout } = remark.revision;
  const path = `/projects/${layout.projectId}/layouts/${layout.id}`;
  return (await planningRecipients(remark.revisionId, transaction)).map(({ email }) => ({ email, path }));
}

/** Everyone on the customer's side who has written in this remark. */
function customerSide(remark: PlacedRemark): Recipient[] {
  return [remark, ...remark.replies].flatMap((row): Recipient[] => {
    if (row.authorSide !== 'customer') return [];
    if (row.guestEmail) return [{ email: row.guestEmail, path: null }];
    return row.user ? [{ email: row.user.email, path: `/revisions/${remark.revisionId}` }] : [];
  });
}

function subjectOf(
  remark: PlacedRemark,
  rest: Pick<TemplateData<'remark'>, 'authorName' | 'body' | 'path'>,
): TemplateData<'remark'> {
  return {
    projectName: remark.revision.layout.project.name,
    layoutTitle: issuedTitle(remark),
    revisionNumber: remark.revision.number,
    remarkNumber: remark.number,
    ...rest,
  };
}

const pathTo = (remark: PlacedRemark): string => `/revisions/${remark.revisionId}?remark=${remark.id}`;

/** Tells the members who are named in what was written. */
export async function notifyNamed(
  named: readonly User[],
  remark: PlacedRemark,
  { writer, body }: { writer: Writer; body: string },
  transaction: Transaction,
): Promise<void> {
  const data = subjectOf(remark, { authorName: writerName(writer), body, path: pathTo(remark) });
  for (const { email } of named) await sendMailLater({ to: email, template: 'mention', data }, transaction);
}

/** Tells a planner that a remark is theirs to deal with now. */
export async function notifyAssignee(
  actor: MemberActor,
  remark: PlacedRemark,
  transaction: Transaction,
): Promise<void> {
  if (!remark.assignee || remark.assignee.id === actor.userId) return;
  const data = {
    ...subjectOf(remark, { authorName: actor.name, body: remark.body, path: pathTo(remark) }),
    dueOn: remark.dueOn,
  };
  await sendMailLater({ to: remark.assignee.email, template: 'assignment', data }, transaction);
}

/**
 * Tells the other side that something was written: the planners of a customer's words, the customer of a planner's answer.
 * Each address gets one mail, and nobody one about their own words.
 */
export async function notifyOtherSide(
  template: 'remark' | 'reply',
  remark: PlacedRemark,
  { writer, body, told = [] }: { writer: Writer; body: string; told?: readonly User[] },
  transaction: Transaction,
): Promise<void> {
  const others = writerSide(writer) === 'customer' ? await plannerSide(remark, transaction) : customerSide(remark);
  const own = 'guest' in writer ? writer.guest.email : writer.actor.email;
  const already = new Set([own, ...told.map(({ email }) => email)]);
  const byAddress = new Map(
    others.filter(({ email }) => !already.has(email)).map((recipient) => [recipient.email, recipient]),
  );
  for (const { email, path } of byAddress.values()) {
    const data: TemplateData<typeof template> = subjectOf(remark, { authorName: writerName(writer), body, path });
    await sendMailLater({ to: email, template, data }, transaction);
  }
}
