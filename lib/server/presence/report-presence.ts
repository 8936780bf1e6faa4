import { literal, Op, QueryTypes, type Transaction } from 'sequelize';
import type { z } from 'zod';
import type { PresenceAnswer, presenceReportSchema } from '@/lib/contracts/presence';
import { Presence, User } from '@/models';
import { sequelize } from '../database';
import { findLayout } from '../layouts/data';
import type { MemberActor } from '../policy';

/** Whoever has not been heard of for so long has closed the page or lost the line. The database's clock counts, not ours. */
const GONE_AFTER_S = 10;

/** Notes where a planner is on a sheet and answers where the others are. Throws not_found. */
export async function reportPresence(
  actor: MemberActor,
  layoutId: string,
  { seat, at, itemIds, leaving }: z.output<typeof presenceReportSchema>,
  transaction?: Transaction,
): Promise<PresenceAnswer> {
  const layout = await findLayout(actor, layoutId, transaction);
  const mine = { layoutId: layout.id, seat, userId: actor.userId };
  const isGone = literal(`seen_at < now() - interval '${GONE_AFTER_S} seconds'`);
  await Presence.destroy({ where: { [Op.and]: [{ layoutId: layout.id }, isGone] }, transaction });
  if (leaving) await Presence.destroy({ where: mine, transaction });
  else {
    // A seat that somebody else holds stays theirs: nobody moves another one's cursor.
    await sequelize.query(
      `INSERT INTO presences (layout_id, seat, user_id, x_mm, y_mm, item_ids, seen_at)
       VALUES (:layoutId, :seat, :userId, :xMm, :yMm, :itemIds, now())
       ON CONFLICT (layout_id, seat) DO UPDATE
         SET x_mm = excluded.x_mm, y_mm = excluded.y_mm, item_ids = excluded.item_ids, seen_at = excluded.seen_at
         WHERE presences.user_id = excluded.user_id`,
      {
        replacements: { ...mine, xMm: at?.xMm ?? null, yMm: at?.yMm ?? null, itemIds: JSON.stringify(itemIds) },
        type: QueryTypes.INSERT,
        transaction,
      },
    );
  }
  const rows = await Presence.findAll({
    where: { layoutId: layout.id, seat: { [Op.ne]: seat } },
    include: [{ model: User, as: 'user', attributes: ['name'], required: true }],
    order: [['seat', 'ASC']],
    transaction,
  });
  return {
    layoutVersion: layout.version,
    others: rows.map((row) => ({
      seat: row.seat,
      name: row.user?.name ?? '',
      at: row.xMm === null || row.yMm === null ? null : { xMm: row.xMm, yMm: row.yMm },
      itemIds: row.itemIds,
    })),
  };
}
