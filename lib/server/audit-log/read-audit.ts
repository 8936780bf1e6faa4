import { col, fn, literal, Op, where as condition, type WhereOptions } from 'sequelize';
import type { AuditEvent as AuditAnswer, AuditFilter, AuditPage, AuditQuery } from '@/lib/contracts/audit';
import { csvOf } from '@/lib/layout/export/csv';
import { AuditEvent, ShareLink, User } from '@/models';
import { sequelize } from '../database';
import { demandRole, type MemberActor } from '../policy';

const PAGE = 100;
/** A table program opens no more rows than this. */
const CSV_MAX = 1_000_000;
const CSV_STEP = 5000;

/** Newest first, a page at a time; for admins. */
export async function readAudit(actor: MemberActor, { before, ...filter }: AuditQuery): Promise<AuditPage> {
  demandRole(actor, 'admin');
  const rows = await eventsOf(actor, filter, before, PAGE + 1);
  const events = rows.slice(0, PAGE);
  const last = events[events.length - 1];
  return {
    events: events.map(present),
    actions: await actionsOf(actor),
    next: rows.length > PAGE && last ? cursorOf(last) : null,
  };
}

export async function auditCsv(actor: MemberActor, filter: AuditFilter): Promise<string> {
  demandRole(actor, 'admin');
  const rows: AuditAnswer[] = [];
  let before = '';
  while (rows.length < CSV_MAX) {
    const step = await eventsOf(actor, filter, before, CSV_STEP);
    rows.push(...step.map(present));
    if (step.length < CSV_STEP) break;
    before = cursorOf(step[step.length - 1]);
  }
  return csvOf(
    ['When (UTC)', 'Who', 'E-mail', 'Came as', 'What', 'Subject', 'Details'],
    rows.map(({ at, who, email, kind, action, subjectId, details }) => [
      at,
      who,
      email,
      kind,
      action,
      subjectId,
      Object.keys(details).length > 0 ? JSON.stringify(details) : null,
    ]),
  );
}

/** Two events of one millisecond are told apart by their ids. */
const cursorOf = ({ createdAt, id }: AuditEvent): string => `${createdAt.getTime()}_${id}`;

async function eventsOf(actor: MemberActor, filter: AuditFilter, before: string, limit: number): Promise<AuditEvent[]> {
  return AuditEvent.findAll({
    where: { [Op.and]: [{ organisationId: actor.organisationId }, ...conditions(filter), ...olderThan(before)] },
    include: [
      { model: User, as: 'user', attributes: ['name', 'email'] },
      { model: ShareLink, as: 'shareLink', attributes: ['label'] },
    ],
    order: [
      [fn('date_trunc', 'milliseconds', col('AuditEvent.created_at')), 'DESC'],
      ['id', 'DESC'],
    ],
    limit,
    subQuery: false,
  });
}

function conditions({ who, action, subjectId, from, to }: AuditFilter): WhereOptions[] {
  const found: WhereOptions[] = [];
  if (who) {
    const like = `%${who.replace(/[\\%_]/g, '\\$&')}%`;
    found.push({
      [Op.or]: [
        { '$user.name$': { [Op.iLike]: like } },
        { '$user.email$': { [Op.iLike]: like } },
        { '$shareLink.label$': { [Op.iLike]: like } },
      ],
    });
  }
  if (action) found.push(action.includes('.') ? { action } : { action: { [Op.startsWith]: `${action}.` } });
  if (subjectId) found.push({ subjectId });
  if (from) found.push({ createdAt: { [Op.gte]: new Date(`${from}T00:00:00Z`) } });
  if (to) found.push({ createdAt: { [Op.lt]: new Date(Date.parse(`${to}T00:00:00Z`) + 24 * 3600 * 1000) } });
  return found;
}

function olderThan(cursor: string): WhereOptions[] {
  if (!cursor) return [];
  const [time, id] = cursor.split('_');
  const at = sequelize.escape(new Date(Number(time)).toISOString());
  // The database keeps microseconds, the cursor milliseconds.
  return [
    condition(
      literal(`(date_trunc('milliseconds', "AuditEvent"."created_at"), "AuditEvent"."id")`),
      '<',
      literal(`(${at}::timestamptz, ${sequelize.escape(id)}::uuid)`),
    ),
  ];
}

async function actionsOf(actor: MemberActor): Promise<string[]> {
  const rows = await AuditEvent.findAll({
    attributes: [[fn('DISTINCT', col('action')), 'action']],
    where: { organisationId: actor.organisationId },
    raw: true,
  });
  return rows.map(({ action }) => action).sort();
}

function present({ id, createdAt, user, shareLink, shareLinkId, action, subjectId, details }: AuditEvent): AuditAnswer {
  const kind = user ? ('apiTokenId' in details ? 'token' : 'member') : shareLinkId ? 'guest' : 'unknown';
  const guest = shareLink?.label ? `Share link “${shareLink.label}”` : 'Share link';
  return {
    id,
    at: createdAt.toISOString(),
    who: user?.name ?? (kind === 'guest' ? guest : 'A former member'),
    email: user?.email ?? null,
    kind,
    action,
    subjectId: subjectId ?? null,
    details,
  };
}
