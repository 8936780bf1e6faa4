import type { Transaction } from 'sequelize';
import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import { findLayout } from '../layouts/data';
import { findRevision } from '../revisions/data';
import type { Reader } from './author';
import { listRemarks } from './data';
import { presentRemark } from './present';

/** On every revision of the layout. */
export async function readLayoutRemarks(
  reader: Reader,
  layoutId: string,
  transaction?: Transaction,
): Promise<RemarkAnswer[]> {
  await findLayout(reader.actor, layoutId, transaction);
  return (await listRemarks(reader.actor, { layoutId }, transaction)).map((remark) => presentRemark(remark, reader));
}

export async function readRevisionRemarks(
  reader: Reader,
  revisionId: string,
  transaction?: Transaction,
): Promise<RemarkAnswer[]> {
  await findRevision(reader.actor, revisionId, transaction);
  return (await listRemarks(reader.actor, { revisionId }, transaction)).map((remark) => presentRemark(remark, reader));
}
