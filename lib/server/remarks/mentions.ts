import type { Transaction } from 'sequelize';
import { RemarkMention, User } from '@/models';
import { invalid } from '../errors';
import type { Writer } from './author';
import { findRemark } from './data';
import { peopleOf } from './people';

/**
 * Keeps who is named, and answers those of them to tell: all but the writer. Throws 422 for somebody who cannot see the project;
 * a guest names nobody.
 */
export async function keepMentions(
  writer: Writer,
  { remarkId, replyId }: { remarkId: string; replyId: string | null },
  mentions: readonly string[],
  transaction: Transaction,
): Promise<User[]> {
  if ('guest' in writer || mentions.length === 0) return [];
  const remark = await findRemark(writer.actor, remarkId, transaction);
  const known = new Set(
    (await peopleOf(writer.actor, remark.revision.layout.projectId, transaction)).map(({ id }) => id),
  );
  const userIds = [...new Set(mentions)];
  if (userIds.some((id) => !known.has(id))) {
    throw invalid('mentions', 'Somebody you named cannot see this project. Take the name out, or invite them first.');
  }
  await RemarkMention.bulkCreate(
    userIds.map((userId) => ({ remarkId, replyId, userId })),
    { transaction },
  );
  return User.findAll({ where: { id: userIds.filter((id) => id !== writer.actor.userId) }, transaction });
}
