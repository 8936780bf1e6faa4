import type { Transaction } from 'sequelize';
import { sendMailLater, type TemplateData } from '../mail';
import { planningRecipients } from '../members/planning-recipients';
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

/**
 * Tells the other side that something was written: the planners of a customer's words, the customer of a planner's answer.
 * Each address gets one mail, and nobody one about their own words.
 */
export async function notifyOtherSide(
  template: 'remark' | 'reply',
  remark: PlacedRemark,
  { writer, body }: { writer: Writer; body: string },
  transaction: Transaction,
): Promise<void> {
  const { layout, number } = remark.revision;
  const others = writerSide(writer) === 'customer' ? await plannerSide(remark, transaction) : customerSide(remark);
  const own = 'guest' in writer ? writer.guest.email : writer.actor.email;
  const byAddress = new Map(
    others.filter(({ email }) => email !== own).map((recipient) => [recipient.email, recipient]),
  );
  for (const { email, path } of byAddress.values()) {
    const data: TemplateData<typeof template> = {
      projectName: layout.project.name,
      layoutTitle: issuedTitle(remark),
      revisionNumber: number,
      remarkNumber: remark.number,
      authorName: writerName(writer),
      body,
      path,
    };
    await sendMailLater({ to: email, template, data }, transaction);
  }
}
